import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A kit design; what it holds lies in its versions. */
export class KitDesign extends Model<InferAttributes<KitDesign>, InferCreationAttributes<KitDesign>> {
  declare id: CreationOptional<number>;
  declare slug: string;
  declare name: string;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
  declare archivedAt: CreationOptional<Date | null>;
}

export function defineKitDesign(sequelize: Sequelize): typeof KitDesign {
  return class extends KitDesign {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      slug: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
      archivedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "KitDesign", tableName: "kit_designs", underscored: true, timestamps: false },
  );
}

export function associateKitDesign(models: Models): void {
  models.KitDesign.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.KitDesign.hasMany(models.KitVersion, { as: "versions", foreignKey: "kitDesignId" });
}
