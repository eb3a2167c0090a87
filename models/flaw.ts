import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A flawed stretch of a bolt, counted from its first free end in 1/160 mm. */
export class Flaw extends Model<InferAttributes<Flaw>, InferCreationAttributes<Flaw>> {
  declare id: CreationOptional<number>;
  declare boltId: number;
  declare startsAt: number;
  declare endsAt: number;
  declare note: CreationOptional<string>;
  declare notedBy: CreationOptional<number | null>;
  declare notedAt: CreationOptional<Date>;
}

export function defineFlaw(sequelize: Sequelize): typeof Flaw {
  return class extends Flaw {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      boltId: { type: DataTypes.INTEGER, allowNull: false },
      startsAt: { type: DataTypes.INTEGER, allowNull: false },
      endsAt: { type: DataTypes.INTEGER, allowNull: false },
      note: DataTypes.TEXT,
      notedBy: DataTypes.INTEGER,
      notedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Flaw", tableName: "flaws", underscored: true, timestamps: false },
  );
}

export function associateFlaw(models: Models): void {
  models.Flaw.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.Flaw.belongsTo(models.Person, { as: "notedPerson", foreignKey: "notedBy" });
}
