import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A line of a sale. Unit price in 1/10 000 of the major unit for fabric, minor units otherwise. */
export class SaleLine extends Model<InferAttributes<SaleLine>, InferCreationAttributes<SaleLine>> {
  declare id: CreationOptional<number>;
  declare saleId: number;
  declare position: number;
  declare item: "fabric" | "kit" | "notion";
  declare description: string;
  declare fabricId: CreationOptional<number | null>;
  declare boltId: CreationOptional<number | null>;
  declare runKitId: CreationOptional<number | null>;
  declare notionId: CreationOptional<number | null>;
  declare cutId: CreationOptional<number | null>;
  declare length: CreationOptional<number | null>;
  declare count: CreationOptional<number>;
  declare unitPrice: number;
  declare amount: number;
  declare tax: number;
}

export function defineSaleLine(sequelize: Sequelize): typeof SaleLine {
  return class extends SaleLine {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      saleId: { type: DataTypes.INTEGER, allowNull: false },
      position: { type: DataTypes.INTEGER, allowNull: false },
      item: { type: DataTypes.TEXT, allowNull: false },
      description: { type: DataTypes.TEXT, allowNull: false },
      fabricId: DataTypes.INTEGER,
      boltId: DataTypes.INTEGER,
      runKitId: DataTypes.INTEGER,
      notionId: DataTypes.INTEGER,
      cutId: DataTypes.INTEGER,
      length: DataTypes.INTEGER,
      count: DataTypes.INTEGER,
      unitPrice: { type: DataTypes.INTEGER, allowNull: false },
      amount: { type: DataTypes.INTEGER, allowNull: false },
      tax: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: "SaleLine", tableName: "sale_lines", underscored: true, timestamps: false },
  );
}

export function associateSaleLine(models: Models): void {
  models.SaleLine.belongsTo(models.Notion, { as: "notion", foreignKey: "notionId" });
  models.SaleLine.belongsTo(models.Sale, { as: "sale", foreignKey: "saleId" });
  models.SaleLine.belongsTo(models.Fabric, { as: "fabric", foreignKey: "fabricId" });
  models.SaleLine.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.SaleLine.belongsTo(models.RunKit, { as: "runKit", foreignKey: "runKitId" });
  models.SaleLine.belongsTo(models.Cut, { as: "cut", foreignKey: "cutId" });
}
