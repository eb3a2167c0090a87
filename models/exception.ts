import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** What a fact upset, for the manager. */
export class Exception extends Model<InferAttributes<Exception>, InferCreationAttributes<Exception>> {
  declare id: CreationOptional<number>;
  declare kind: "reservation-short" | "book-corrected" | "run-short" | "price-differs" | "kit-sold-twice" | "cut-elsewhere";
  declare sentence: string;
  declare boltId: CreationOptional<number | null>;
  declare runId: CreationOptional<number | null>;
  declare facts: CreationOptional<object>;
  declare raisedAt: CreationOptional<Date>;
  declare settledAt: CreationOptional<Date | null>;
  declare settledBy: CreationOptional<number | null>;
  declare settlement: CreationOptional<string | null>;
}

export function defineException(sequelize: Sequelize): typeof Exception {
  return class extends Exception {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      kind: { type: DataTypes.TEXT, allowNull: false },
      sentence: { type: DataTypes.TEXT, allowNull: false },
      boltId: DataTypes.INTEGER,
      runId: DataTypes.INTEGER,
      facts: DataTypes.JSONB,
      raisedAt: DataTypes.DATE,
      settledAt: DataTypes.DATE,
      settledBy: DataTypes.INTEGER,
      settlement: DataTypes.TEXT,
    },
    { sequelize, modelName: "Exception", tableName: "exceptions", underscored: true, timestamps: false },
  );
}

export function associateException(models: Models): void {
  models.Exception.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.Exception.belongsTo(models.Run, { as: "run", foreignKey: "runId" });
  models.Exception.belongsTo(models.Person, { as: "settledPerson", foreignKey: "settledBy" });
}
