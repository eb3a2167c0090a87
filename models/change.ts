import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** Who changed what; append-only. */
export class Change extends Model<InferAttributes<Change>, InferCreationAttributes<Change>> {
  declare id: CreationOptional<number>;
  declare at: CreationOptional<Date>;
  declare personId: CreationOptional<number | null>;
  declare subject: string;
  declare subjectId: string;
  declare act: string;
  declare details: CreationOptional<object>;
}

export function defineChange(sequelize: Sequelize): typeof Change {
  return class extends Change {}.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      at: DataTypes.DATE,
      personId: DataTypes.INTEGER,
      subject: { type: DataTypes.TEXT, allowNull: false },
      subjectId: { type: DataTypes.TEXT, allowNull: false },
      act: { type: DataTypes.TEXT, allowNull: false },
      details: DataTypes.JSONB,
    },
    { sequelize, modelName: "Change", tableName: "changes", underscored: true, timestamps: false },
  );
}

export function associateChange(models: Models): void {
  models.Change.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
}
