import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** From opening with a float to counting at closing; minor units. */
export class TillSession extends Model<InferAttributes<TillSession>, InferCreationAttributes<TillSession>> {
  declare id: CreationOptional<number>;
  declare tillId: number;
  declare openedBy: number;
  declare openedAt: CreationOptional<Date>;
  declare closedBy: CreationOptional<number | null>;
  declare closedAt: CreationOptional<Date | null>;
  declare counted: CreationOptional<number | null>;
  declare expected: CreationOptional<number | null>;
}

export function defineTillSession(sequelize: Sequelize): typeof TillSession {
  return class extends TillSession {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      tillId: { type: DataTypes.INTEGER, allowNull: false },
      openedBy: { type: DataTypes.INTEGER, allowNull: false },
      openedAt: DataTypes.DATE,
      closedBy: DataTypes.INTEGER,
      closedAt: DataTypes.DATE,
      counted: DataTypes.INTEGER,
      expected: DataTypes.INTEGER,
    },
    { sequelize, modelName: "TillSession", tableName: "till_sessions", underscored: true, timestamps: false },
  );
}

export function associateTillSession(models: Models): void {
  models.TillSession.belongsTo(models.Person, { as: "closedPerson", foreignKey: "closedBy" });
  models.TillSession.belongsTo(models.Person, { as: "openedPerson", foreignKey: "openedBy" });
  models.TillSession.belongsTo(models.Till, { as: "till", foreignKey: "tillId" });
  models.TillSession.hasMany(models.CashMove, { as: "cashMoves", foreignKey: "tillSessionId" });
  models.TillSession.hasMany(models.Sale, { as: "sales", foreignKey: "tillSessionId" });
}
