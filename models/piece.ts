import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A remnant, return or fat quarter with a tag of its own. */
export class Piece extends Model<InferAttributes<Piece>, InferCreationAttributes<Piece>> {
  declare id: CreationOptional<number>;
  declare tag: string;
  declare fabricId: number;
  declare boltId: CreationOptional<number | null>;
  declare lot: string;
  declare kind: "remnant" | "fat-quarter" | "flat-fold" | "return";
  declare length: number;
  declare width: number;
  declare shelf: CreationOptional<string>;
  declare state: CreationOptional<"on-shelf" | "sold" | "used" | "written-off">;
  declare madeAt: CreationOptional<Date>;
}

export function definePiece(sequelize: Sequelize): typeof Piece {
  return class extends Piece {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      tag: { type: DataTypes.TEXT, allowNull: false },
      fabricId: { type: DataTypes.INTEGER, allowNull: false },
      boltId: DataTypes.INTEGER,
      lot: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      length: { type: DataTypes.INTEGER, allowNull: false },
      width: { type: DataTypes.INTEGER, allowNull: false },
      shelf: DataTypes.TEXT,
      state: DataTypes.TEXT,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Piece", tableName: "pieces", underscored: true, timestamps: false },
  );
}

export function associatePiece(models: Models): void {
  models.Piece.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.Piece.belongsTo(models.Fabric, { as: "fabric", foreignKey: "fabricId" });
}
