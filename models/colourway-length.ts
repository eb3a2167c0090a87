import { DataTypes, Model, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** The length of a fabric that one kit of a colourway takes, in 1/160 mm. */
export class ColourwayLength extends Model<InferAttributes<ColourwayLength>, InferCreationAttributes<ColourwayLength>> {
  declare colourwayId: number;
  declare fabricId: number;
  declare cutLength: number;
  declare plannedWidth: number;
}

export function defineColourwayLength(sequelize: Sequelize): typeof ColourwayLength {
  return class extends ColourwayLength {}.init(
    {
      colourwayId: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
      fabricId: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
      cutLength: { type: DataTypes.INTEGER, allowNull: false },
      plannedWidth: { type: DataTypes.INTEGER, allowNull: false },
    },
    { sequelize, modelName: "ColourwayLength", tableName: "colourway_lengths", underscored: true, timestamps: false },
  );
}

export function associateColourwayLength(models: Models): void {
  models.ColourwayLength.belongsTo(models.Colourway, { as: "colourway", foreignKey: "colourwayId" });
  models.ColourwayLength.belongsTo(models.Fabric, { as: "fabric", foreignKey: "fabricId" });
}
