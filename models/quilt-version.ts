import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** An immutable version of a quilt; lengths in 1/160 mm. */
export class QuiltVersion extends Model<InferAttributes<QuiltVersion>, InferCreationAttributes<QuiltVersion>> {
  declare id: CreationOptional<number>;
  declare quiltId: number;
  declare version: number;
  declare name: string;
  declare design: object;
  declare blockVersionIds: number[];
  declare width: number;
  declare height: number;
  declare coreVersion: string;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
}

export function defineQuiltVersion(sequelize: Sequelize): typeof QuiltVersion {
  return class extends QuiltVersion {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      quiltId: { type: DataTypes.INTEGER, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      design: { type: DataTypes.JSONB, allowNull: false },
      blockVersionIds: { type: DataTypes.ARRAY(DataTypes.INTEGER), allowNull: false },
      width: { type: DataTypes.INTEGER, allowNull: false },
      height: { type: DataTypes.INTEGER, allowNull: false },
      coreVersion: { type: DataTypes.TEXT, allowNull: false },
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "QuiltVersion", tableName: "quilt_versions", underscored: true, timestamps: false },
  );
}

export function associateQuiltVersion(models: Models): void {
  models.QuiltVersion.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.QuiltVersion.belongsTo(models.Quilt, { as: "quilt", foreignKey: "quiltId" });
}
