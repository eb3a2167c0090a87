import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** One double-entry move; append-only. Fabric in 1/160 mm of bolt length, the rest in counts. */
export class Move extends Model<InferAttributes<Move>, InferCreationAttributes<Move>> {
  declare id: CreationOptional<number>;
  declare at: CreationOptional<Date>;
  declare personId: CreationOptional<number | null>;
  declare requestId: CreationOptional<string | null>;
  declare item: "fabric" | "notion" | "kit";
  declare fabricId: CreationOptional<number | null>;
  declare notionId: CreationOptional<number | null>;
  declare runKitId: CreationOptional<number | null>;
  declare quantity: number;
  declare fromPlace: "supplier" | "bolt" | "piece" | "bag" | "bench" | "kit" | "shelf" | "customer" | "waste" | "sample" | "found-or-lost";
  declare fromId: CreationOptional<number | null>;
  declare toPlace: "supplier" | "bolt" | "piece" | "bag" | "bench" | "kit" | "shelf" | "customer" | "waste" | "sample" | "found-or-lost";
  declare toId: CreationOptional<number | null>;
  declare reason: string;
  declare cutId: CreationOptional<number | null>;
  declare reversesId: CreationOptional<number | null>;
}

export function defineMove(sequelize: Sequelize): typeof Move {
  return class extends Move {}.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      at: DataTypes.DATE,
      personId: DataTypes.INTEGER,
      requestId: DataTypes.UUID,
      item: { type: DataTypes.TEXT, allowNull: false },
      fabricId: DataTypes.INTEGER,
      notionId: DataTypes.INTEGER,
      runKitId: DataTypes.INTEGER,
      quantity: { type: DataTypes.INTEGER, allowNull: false },
      fromPlace: { type: DataTypes.TEXT, allowNull: false },
      fromId: DataTypes.INTEGER,
      toPlace: { type: DataTypes.TEXT, allowNull: false },
      toId: DataTypes.INTEGER,
      reason: { type: DataTypes.TEXT, allowNull: false },
      cutId: DataTypes.INTEGER,
      reversesId: DataTypes.BIGINT,
    },
    { sequelize, modelName: "Move", tableName: "moves", underscored: true, timestamps: false },
  );
}

export function associateMove(models: Models): void {
  models.Move.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
  models.Move.belongsTo(models.Fabric, { as: "fabric", foreignKey: "fabricId" });
  models.Move.belongsTo(models.Notion, { as: "notion", foreignKey: "notionId" });
  models.Move.belongsTo(models.Move, { as: "reverses", foreignKey: "reversesId" });
  models.Move.belongsTo(models.RunKit, { as: "runKit", foreignKey: "runKitId" });
}
