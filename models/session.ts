import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A signed-in device; revoked at once by `revokedAt`. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: string;
  declare personId: number;
  declare createdAt: CreationOptional<Date>;
  declare lastSeenAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare revokedAt: CreationOptional<Date | null>;
  declare device: CreationOptional<string | null>;
}

export function defineSession(sequelize: Sequelize): typeof Session {
  return class extends Session {}.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
      personId: { type: DataTypes.INTEGER, allowNull: false },
      createdAt: DataTypes.DATE,
      lastSeenAt: DataTypes.DATE,
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      revokedAt: DataTypes.DATE,
      device: DataTypes.TEXT,
    },
    { sequelize, modelName: "Session", tableName: "sessions", underscored: true, timestamps: false },
  );
}

export function associateSession(models: Models): void {
  models.Session.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
}
