import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A quilt; what is set lies in its versions. */
export class Quilt extends Model<InferAttributes<Quilt>, InferCreationAttributes<Quilt>> {
  declare id: CreationOptional<number>;
  declare slug: string;
  declare name: string;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
  declare archivedAt: CreationOptional<Date | null>;
}

export function defineQuilt(sequelize: Sequelize): typeof Quilt {
  return class extends Quilt {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      slug: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
      archivedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Quilt", tableName: "quilts", underscored: true, timestamps: false },
  );
}

export function associateQuilt(models: Models): void {
  models.Quilt.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.Quilt.hasMany(models.QuiltVersion, { as: "versions", foreignKey: "quiltId" });
}
