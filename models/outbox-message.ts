import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A letter written in the transaction that causes it and sent afterwards. */
export class OutboxMessage extends Model<InferAttributes<OutboxMessage>, InferCreationAttributes<OutboxMessage>> {
  declare id: CreationOptional<number>;
  declare kind: string;
  declare toAddress: string;
  declare subject: string;
  declare body: string;
  declare state: CreationOptional<"waiting" | "sent" | "failed">;
  declare attempts: CreationOptional<number>;
  declare nextAttemptAt: CreationOptional<Date>;
  declare error: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
}

export function defineOutboxMessage(sequelize: Sequelize): typeof OutboxMessage {
  return class extends OutboxMessage {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      kind: { type: DataTypes.TEXT, allowNull: false },
      toAddress: { type: DataTypes.TEXT, allowNull: false },
      subject: { type: DataTypes.TEXT, allowNull: false },
      body: { type: DataTypes.TEXT, allowNull: false },
      state: DataTypes.TEXT,
      attempts: DataTypes.INTEGER,
      nextAttemptAt: DataTypes.DATE,
      error: DataTypes.TEXT,
      createdAt: DataTypes.DATE,
      sentAt: DataTypes.DATE,
    },
    { sequelize, modelName: "OutboxMessage", tableName: "outbox_messages", underscored: true, timestamps: false },
  );
}
