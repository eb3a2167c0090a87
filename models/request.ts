import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A request that was answered, with its answer. */
export class Request extends Model<InferAttributes<Request>, InferCreationAttributes<Request>> {
  declare id: string;
  declare actorId: number;
  declare kind: string;
  declare contentHash: string;
  declare result: CreationOptional<object | null>;
  declare createdAt: CreationOptional<Date>;
}

export function defineRequest(sequelize: Sequelize): typeof Request {
  return class extends Request {}.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
      actorId: { type: DataTypes.INTEGER, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      contentHash: { type: DataTypes.TEXT, allowNull: false },
      result: DataTypes.JSONB,
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Request", tableName: "requests", underscored: true, timestamps: false },
  );
}

export function associateRequest(models: Models): void {
  models.Request.belongsTo(models.Person, { as: "actor", foreignKey: "actorId" });
}
