import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** One cut in the chain of its bolt, in 1/160 mm. PostgreSQL itself refuses overlap, gaps and the removal of any but the last. */
export class Cut extends Model<InferAttributes<Cut>, InferCreationAttributes<Cut>> {
  declare id: CreationOptional<number>;
  declare boltId: number;
  declare startsAt: number;
  declare endsAt: number;
  declare beginsAfter: CreationOptional<number | null>;
  declare purpose: "kit" | "sale" | "waste" | "mis-cut" | "sample" | "correction" | "piece";
  declare runLengthId: CreationOptional<number | null>;
  declare personId: CreationOptional<number | null>;
  declare requestId: CreationOptional<string | null>;
  declare at: CreationOptional<Date>;
  declare note: CreationOptional<string>;
}

export function defineCut(sequelize: Sequelize): typeof Cut {
  return class extends Cut {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      boltId: { type: DataTypes.INTEGER, allowNull: false },
      startsAt: { type: DataTypes.INTEGER, allowNull: false },
      endsAt: { type: DataTypes.INTEGER, allowNull: false },
      beginsAfter: DataTypes.INTEGER,
      purpose: { type: DataTypes.TEXT, allowNull: false },
      runLengthId: DataTypes.INTEGER,
      personId: DataTypes.INTEGER,
      requestId: DataTypes.UUID,
      at: DataTypes.DATE,
      note: DataTypes.TEXT,
    },
    { sequelize, modelName: "Cut", tableName: "cuts", underscored: true, timestamps: false },
  );
}

export function associateCut(models: Models): void {
  models.Cut.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.Cut.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
  models.Cut.belongsTo(models.RunLength, { as: "runLength", foreignKey: "runLengthId" });
}
