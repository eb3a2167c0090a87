import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A bolt: a line from its first free end, in 1/160 mm. `cutEdge` and `reserved` are cached sums. */
export class Bolt extends Model<InferAttributes<Bolt>, InferCreationAttributes<Bolt>> {
  declare id: CreationOptional<number>;
  declare tag: string;
  declare fabricId: number;
  declare lot: string;
  declare shelf: CreationOptional<string>;
  declare usableWidth: CreationOptional<number | null>;
  declare invoiced: CreationOptional<number | null>;
  declare putUp: number;
  declare cutEdge: CreationOptional<number>;
  declare reserved: CreationOptional<number>;
  declare receivedAt: CreationOptional<Date>;
  declare retiredAt: CreationOptional<Date | null>;
}

export function defineBolt(sequelize: Sequelize): typeof Bolt {
  return class extends Bolt {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      tag: { type: DataTypes.TEXT, allowNull: false },
      fabricId: { type: DataTypes.INTEGER, allowNull: false },
      lot: { type: DataTypes.TEXT, allowNull: false },
      shelf: DataTypes.TEXT,
      usableWidth: DataTypes.INTEGER,
      invoiced: DataTypes.INTEGER,
      putUp: { type: DataTypes.INTEGER, allowNull: false },
      cutEdge: DataTypes.INTEGER,
      reserved: DataTypes.INTEGER,
      receivedAt: DataTypes.DATE,
      retiredAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Bolt", tableName: "bolts", underscored: true, timestamps: false },
  );
}

export function associateBolt(models: Models): void {
  models.Bolt.belongsTo(models.Fabric, { as: "fabric", foreignKey: "fabricId" });
  models.Bolt.hasMany(models.Cut, { as: "cuts", foreignKey: "boltId" });
  models.Bolt.hasMany(models.Flaw, { as: "flaws", foreignKey: "boltId" });
  models.Bolt.hasMany(models.Reservation, { as: "reservations", foreignKey: "boltId" });
}
