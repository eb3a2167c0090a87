import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** One length that a kit of a run needs. `boltId` is the bolt it is planned on; the one it came from is its cut's. */
export class RunLength extends Model<InferAttributes<RunLength>, InferCreationAttributes<RunLength>> {
  declare id: CreationOptional<number>;
  declare runId: number;
  declare runKitId: number;
  declare fabricId: number;
  declare boltId: CreationOptional<number | null>;
  declare length: number;
  declare plannedWidth: number;
  declare sequence: number;
  declare state: CreationOptional<"to-cut" | "cut" | "short" | "cancelled">;
  declare cutId: CreationOptional<number | null>;
  declare packedAt: CreationOptional<Date | null>;
  declare packedBy: CreationOptional<number | null>;
}

export function defineRunLength(sequelize: Sequelize): typeof RunLength {
  return class extends RunLength {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      runId: { type: DataTypes.INTEGER, allowNull: false },
      runKitId: { type: DataTypes.INTEGER, allowNull: false },
      fabricId: { type: DataTypes.INTEGER, allowNull: false },
      boltId: DataTypes.INTEGER,
      length: { type: DataTypes.INTEGER, allowNull: false },
      plannedWidth: { type: DataTypes.INTEGER, allowNull: false },
      sequence: { type: DataTypes.INTEGER, allowNull: false },
      state: DataTypes.TEXT,
      cutId: DataTypes.INTEGER,
      packedAt: DataTypes.DATE,
      packedBy: DataTypes.INTEGER,
    },
    { sequelize, modelName: "RunLength", tableName: "run_lengths", underscored: true, timestamps: false },
  );
}

export function associateRunLength(models: Models): void {
  models.RunLength.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.RunLength.belongsTo(models.Cut, { as: "cut", foreignKey: "cutId" });
  models.RunLength.belongsTo(models.Fabric, { as: "fabric", foreignKey: "fabricId" });
  models.RunLength.belongsTo(models.Person, { as: "packedPerson", foreignKey: "packedBy" });
  models.RunLength.belongsTo(models.Run, { as: "run", foreignKey: "runId" });
  models.RunLength.belongsTo(models.RunKit, { as: "runKit", foreignKey: "runKitId" });
}
