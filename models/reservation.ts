import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** So many pieces of a length promised on a bolt. A held row fits on it; a short one no longer does. */
export class Reservation extends Model<InferAttributes<Reservation>, InferCreationAttributes<Reservation>> {
  declare id: CreationOptional<number>;
  declare boltId: number;
  declare length: number;
  declare count: number;
  declare runId: CreationOptional<number | null>;
  declare state: CreationOptional<"held" | "short" | "ended">;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
}

export function defineReservation(sequelize: Sequelize): typeof Reservation {
  return class extends Reservation {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      boltId: { type: DataTypes.INTEGER, allowNull: false },
      length: { type: DataTypes.INTEGER, allowNull: false },
      count: { type: DataTypes.INTEGER, allowNull: false },
      runId: DataTypes.INTEGER,
      state: DataTypes.TEXT,
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Reservation", tableName: "reservations", underscored: true, timestamps: false },
  );
}

export function associateReservation(models: Models): void {
  models.Reservation.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.Reservation.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.Reservation.belongsTo(models.Run, { as: "run", foreignKey: "runId" });
}
