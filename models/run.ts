import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A run of so many kits of one colourway. */
export class Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  declare id: CreationOptional<number>;
  declare code: string;
  declare colourwayId: number;
  declare kits: number;
  declare purpose: CreationOptional<"shelf" | "class" | "orders">;
  declare due: CreationOptional<string | null>;
  declare state: CreationOptional<"reserved" | "cutting" | "cut" | "packed" | "cancelled">;
  declare boltPlan: object;
  declare note: CreationOptional<string>;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
}

export function defineRun(sequelize: Sequelize): typeof Run {
  return class extends Run {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      code: { type: DataTypes.TEXT, allowNull: false },
      colourwayId: { type: DataTypes.INTEGER, allowNull: false },
      kits: { type: DataTypes.INTEGER, allowNull: false },
      purpose: DataTypes.TEXT,
      due: DataTypes.DATEONLY,
      state: DataTypes.TEXT,
      boltPlan: { type: DataTypes.JSONB, allowNull: false },
      note: DataTypes.TEXT,
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Run", tableName: "runs", underscored: true, timestamps: false },
  );
}

export function associateRun(models: Models): void {
  models.Run.belongsTo(models.Colourway, { as: "colourway", foreignKey: "colourwayId" });
  models.Run.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.Run.hasMany(models.RunKit, { as: "runKits", foreignKey: "runId" });
  models.Run.hasMany(models.RunLength, { as: "lengths", foreignKey: "runId" });
  models.Run.hasMany(models.Reservation, { as: "reservations", foreignKey: "runId" });
}
