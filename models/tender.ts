import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** What was paid with; minor units. */
export class Tender extends Model<InferAttributes<Tender>, InferCreationAttributes<Tender>> {
  declare id: CreationOptional<number>;
  declare saleId: number;
  declare kind: "cash" | "card" | "gift-card" | "store-credit";
  declare amount: number;
  declare given: number;
  declare changeGiven: CreationOptional<number>;
}

export function defineTender(sequelize: Sequelize): typeof Tender {
  return class extends Tender {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      saleId: { type: DataTypes.INTEGER, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      amount: { type: DataTypes.INTEGER, allowNull: false },
      given: { type: DataTypes.INTEGER, allowNull: false },
      changeGiven: DataTypes.INTEGER,
    },
    { sequelize, modelName: "Tender", tableName: "tenders", underscored: true, timestamps: false },
  );
}

export function associateTender(models: Models): void {
  models.Tender.belongsTo(models.Sale, { as: "sale", foreignKey: "saleId" });
}
