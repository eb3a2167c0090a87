import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A sale with its receipt; minor units. */
export class Sale extends Model<InferAttributes<Sale>, InferCreationAttributes<Sale>> {
  declare id: CreationOptional<number>;
  declare receipt: string;
  declare tillSessionId: number;
  declare personId: number;
  declare requestId: string;
  declare at: CreationOptional<Date>;
  declare recordedAt: CreationOptional<Date>;
  declare goods: number;
  declare tax: number;
  declare rounding: CreationOptional<number>;
  declare total: number;
  declare currency: string;
}

export function defineSale(sequelize: Sequelize): typeof Sale {
  return class extends Sale {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      receipt: { type: DataTypes.TEXT, allowNull: false },
      tillSessionId: { type: DataTypes.INTEGER, allowNull: false },
      personId: { type: DataTypes.INTEGER, allowNull: false },
      requestId: { type: DataTypes.UUID, allowNull: false },
      at: DataTypes.DATE,
      recordedAt: DataTypes.DATE,
      goods: { type: DataTypes.INTEGER, allowNull: false },
      tax: { type: DataTypes.INTEGER, allowNull: false },
      rounding: DataTypes.INTEGER,
      total: { type: DataTypes.INTEGER, allowNull: false },
      currency: { type: DataTypes.CHAR(3), allowNull: false },
    },
    { sequelize, modelName: "Sale", tableName: "sales", underscored: true, timestamps: false },
  );
}

export function associateSale(models: Models): void {
  models.Sale.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
  models.Sale.belongsTo(models.TillSession, { as: "tillSession", foreignKey: "tillSessionId" });
  models.Sale.hasMany(models.SaleLine, { as: "lines", foreignKey: "saleId" });
  models.Sale.hasMany(models.Tender, { as: "tenders", foreignKey: "saleId" });
}
