import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A document on the print queue. */
export class PrintJob extends Model<InferAttributes<PrintJob>, InferCreationAttributes<PrintJob>> {
  declare id: CreationOptional<number>;
  declare printer: "label-4x6" | "label-small" | "receipt" | "sheet";
  declare title: string;
  declare document: object;
  declare copies: CreationOptional<number>;
  declare state: CreationOptional<"waiting" | "printing" | "printed" | "failed" | "withdrawn">;
  declare attempts: CreationOptional<number>;
  declare error: CreationOptional<string | null>;
  declare askedBy: CreationOptional<number | null>;
  declare askedAt: CreationOptional<Date>;
  declare takenAt: CreationOptional<Date | null>;
  declare printedAt: CreationOptional<Date | null>;
}

export function definePrintJob(sequelize: Sequelize): typeof PrintJob {
  return class extends PrintJob {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      printer: { type: DataTypes.TEXT, allowNull: false },
      title: { type: DataTypes.TEXT, allowNull: false },
      document: { type: DataTypes.JSONB, allowNull: false },
      copies: DataTypes.INTEGER,
      state: DataTypes.TEXT,
      attempts: DataTypes.INTEGER,
      error: DataTypes.TEXT,
      askedBy: DataTypes.INTEGER,
      askedAt: DataTypes.DATE,
      takenAt: DataTypes.DATE,
      printedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "PrintJob", tableName: "print_jobs", underscored: true, timestamps: false },
  );
}

export function associatePrintJob(models: Models): void {
  models.PrintJob.belongsTo(models.Person, { as: "askedPerson", foreignKey: "askedBy" });
}
