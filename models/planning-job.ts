import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A plan that is asked for, made or done. */
export class PlanningJob extends Model<InferAttributes<PlanningJob>, InferCreationAttributes<PlanningJob>> {
  declare id: string;
  declare kind: "kit" | "bolts";
  declare input: object;
  declare inputHash: string;
  declare coreVersion: string;
  declare state: CreationOptional<"waiting" | "running" | "done" | "stopped" | "failed">;
  declare progress: CreationOptional<number>;
  declare sentence: CreationOptional<string>;
  declare result: CreationOptional<object | null>;
  declare stopAsked: CreationOptional<boolean>;
  declare askedBy: CreationOptional<number | null>;
  declare worker: CreationOptional<string | null>;
  declare heartbeatAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare endedAt: CreationOptional<Date | null>;
}

export function definePlanningJob(sequelize: Sequelize): typeof PlanningJob {
  return class extends PlanningJob {}.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      input: { type: DataTypes.JSONB, allowNull: false },
      inputHash: { type: DataTypes.TEXT, allowNull: false },
      coreVersion: { type: DataTypes.TEXT, allowNull: false },
      state: DataTypes.TEXT,
      progress: DataTypes.INTEGER,
      sentence: DataTypes.TEXT,
      result: DataTypes.JSONB,
      stopAsked: DataTypes.BOOLEAN,
      askedBy: DataTypes.INTEGER,
      worker: DataTypes.TEXT,
      heartbeatAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
      endedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "PlanningJob", tableName: "planning_jobs", underscored: true, timestamps: false },
  );
}

export function associatePlanningJob(models: Models): void {
  models.PlanningJob.belongsTo(models.Person, { as: "askedPerson", foreignKey: "askedBy" });
}
