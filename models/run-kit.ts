import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** One kit of a run, with its serial. */
export class RunKit extends Model<InferAttributes<RunKit>, InferCreationAttributes<RunKit>> {
  declare id: CreationOptional<number>;
  declare runId: number;
  declare number: number;
  declare serial: string;
  declare state: CreationOptional<"waiting" | "cut" | "packed" | "sold" | "broken-down" | "cancelled">;
  declare shelf: CreationOptional<string>;
  declare packedBy: CreationOptional<number | null>;
  declare packedAt: CreationOptional<Date | null>;
}

export function defineRunKit(sequelize: Sequelize): typeof RunKit {
  return class extends RunKit {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      runId: { type: DataTypes.INTEGER, allowNull: false },
      number: { type: DataTypes.INTEGER, allowNull: false },
      serial: { type: DataTypes.TEXT, allowNull: false },
      state: DataTypes.TEXT,
      shelf: DataTypes.TEXT,
      packedBy: DataTypes.INTEGER,
      packedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "RunKit", tableName: "run_kits", underscored: true, timestamps: false },
  );
}

export function associateRunKit(models: Models): void {
  models.RunKit.belongsTo(models.Person, { as: "packedPerson", foreignKey: "packedBy" });
  models.RunKit.belongsTo(models.Run, { as: "run", foreignKey: "runId" });
  models.RunKit.hasMany(models.RunLength, { as: "lengths", foreignKey: "runKitId" });
  models.RunKit.hasMany(models.PackedNotion, { as: "notions", foreignKey: "runKitId" });
}
