import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** Fabrics to the roles of a kit version, with the price in minor units. */
export class Colourway extends Model<InferAttributes<Colourway>, InferCreationAttributes<Colourway>> {
  declare id: CreationOptional<number>;
  declare kitVersionId: number;
  declare name: string;
  declare fabrics: object;
  declare price: number;
  declare planHash: string;
  declare coreVersion: string;
  declare onSale: CreationOptional<boolean>;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
}

export function defineColourway(sequelize: Sequelize): typeof Colourway {
  return class extends Colourway {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      kitVersionId: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      fabrics: { type: DataTypes.JSONB, allowNull: false },
      price: { type: DataTypes.INTEGER, allowNull: false },
      planHash: { type: DataTypes.TEXT, allowNull: false },
      coreVersion: { type: DataTypes.TEXT, allowNull: false },
      onSale: DataTypes.BOOLEAN,
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Colourway", tableName: "colourways", underscored: true, timestamps: false },
  );
}

export function associateColourway(models: Models): void {
  models.Colourway.belongsTo(models.KitVersion, { as: "kitVersion", foreignKey: "kitVersionId" });
  models.Colourway.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.Colourway.hasMany(models.ColourwayLength, { as: "lengths", foreignKey: "colourwayId" });
  models.Colourway.hasMany(models.Run, { as: "runs", foreignKey: "colourwayId" });
}
