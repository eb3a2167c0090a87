import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A fabric; lengths in 1/160 mm, prices in 1/10 000 of the major unit per yard or metre. */
export class Fabric extends Model<InferAttributes<Fabric>, InferCreationAttributes<Fabric>> {
  declare id: CreationOptional<number>;
  declare slug: string;
  declare name: string;
  declare reference: CreationOptional<string>;
  declare description: CreationOptional<string>;
  declare supplierId: CreationOptional<number | null>;
  declare width: number;
  declare usableWidth: number;
  declare fibre: CreationOptional<string>;
  declare origin: CreationOptional<string>;
  declare oneWay: CreationOptional<boolean>;
  declare tile: CreationOptional<string>;
  declare colour: string;
  declare value: CreationOptional<"light" | "medium" | "dark">;
  declare price: number;
  declare cost: number;
  declare lowMark: CreationOptional<number>;
  declare inPrint: CreationOptional<boolean>;
  declare madeAt: CreationOptional<Date>;
}

export function defineFabric(sequelize: Sequelize): typeof Fabric {
  return class extends Fabric {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      slug: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      reference: DataTypes.TEXT,
      description: DataTypes.TEXT,
      supplierId: DataTypes.INTEGER,
      width: { type: DataTypes.INTEGER, allowNull: false },
      usableWidth: { type: DataTypes.INTEGER, allowNull: false },
      fibre: DataTypes.TEXT,
      origin: DataTypes.TEXT,
      oneWay: DataTypes.BOOLEAN,
      tile: DataTypes.TEXT,
      colour: { type: DataTypes.CHAR(7), allowNull: false },
      value: DataTypes.TEXT,
      price: { type: DataTypes.INTEGER, allowNull: false },
      cost: { type: DataTypes.INTEGER, allowNull: false },
      lowMark: DataTypes.INTEGER,
      inPrint: DataTypes.BOOLEAN,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Fabric", tableName: "fabrics", underscored: true, timestamps: false },
  );
}

export function associateFabric(models: Models): void {
  models.Fabric.belongsTo(models.Supplier, { as: "supplier", foreignKey: "supplierId" });
  models.Fabric.hasMany(models.Bolt, { as: "bolts", foreignKey: "fabricId" });
}
