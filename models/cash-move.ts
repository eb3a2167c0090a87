import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** Cash into (positive) or out of a drawer, in minor units; append-only. */
export class CashMove extends Model<InferAttributes<CashMove>, InferCreationAttributes<CashMove>> {
  declare id: CreationOptional<number>;
  declare tillSessionId: number;
  declare amount: number;
  declare kind: "float" | "sale" | "refund" | "pay-in" | "pay-out";
  declare reason: string;
  declare saleId: CreationOptional<number | null>;
  declare personId: number;
  declare requestId: CreationOptional<string | null>;
  declare at: CreationOptional<Date>;
}

export function defineCashMove(sequelize: Sequelize): typeof CashMove {
  return class extends CashMove {}.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      tillSessionId: { type: DataTypes.INTEGER, allowNull: false },
      amount: { type: DataTypes.INTEGER, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      reason: { type: DataTypes.TEXT, allowNull: false },
      saleId: DataTypes.INTEGER,
      personId: { type: DataTypes.INTEGER, allowNull: false },
      requestId: DataTypes.UUID,
      at: DataTypes.DATE,
    },
    { sequelize, modelName: "CashMove", tableName: "cash_moves", underscored: true, timestamps: false },
  );
}

export function associateCashMove(models: Models): void {
  models.CashMove.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
  models.CashMove.belongsTo(models.Sale, { as: "sale", foreignKey: "saleId" });
  models.CashMove.belongsTo(models.TillSession, { as: "tillSession", foreignKey: "tillSessionId" });
}
