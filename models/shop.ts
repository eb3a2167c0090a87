import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** The shop's own settings: one row. */
export class Shop extends Model<InferAttributes<Shop>, InferCreationAttributes<Shop>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare address: CreationOptional<string>;
  declare email: CreationOptional<string>;
  declare currency: string;
  declare locale: CreationOptional<string>;
  declare timeZone: CreationOptional<string>;
  declare system: "yards" | "metres";
  declare paper: CreationOptional<"letter" | "a4">;
  declare seamAllowance: number;
  declare rulerStep: number;
  declare sellingStep: number;
  declare leastCut: number;
  declare straightening: number;
  declare misCutBasisPoints: CreationOptional<number>;
  declare endOfBolt: CreationOptional<number>;
  declare saleableRemnant: number;
  declare labourRate: CreationOptional<number>;
  declare taxBy: CreationOptional<"line" | "sale">;
  declare taxIncluded: CreationOptional<boolean>;
  declare cashStep: CreationOptional<number>;
  declare updatedAt: CreationOptional<Date>;
}

export function defineShop(sequelize: Sequelize): typeof Shop {
  return class extends Shop {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      address: DataTypes.TEXT,
      email: DataTypes.TEXT,
      currency: { type: DataTypes.CHAR(3), allowNull: false },
      locale: DataTypes.TEXT,
      timeZone: DataTypes.TEXT,
      system: { type: DataTypes.TEXT, allowNull: false },
      paper: DataTypes.TEXT,
      seamAllowance: { type: DataTypes.INTEGER, allowNull: false },
      rulerStep: { type: DataTypes.INTEGER, allowNull: false },
      sellingStep: { type: DataTypes.INTEGER, allowNull: false },
      leastCut: { type: DataTypes.INTEGER, allowNull: false },
      straightening: { type: DataTypes.INTEGER, allowNull: false },
      misCutBasisPoints: DataTypes.INTEGER,
      endOfBolt: DataTypes.INTEGER,
      saleableRemnant: { type: DataTypes.INTEGER, allowNull: false },
      labourRate: DataTypes.INTEGER,
      taxBy: DataTypes.TEXT,
      taxIncluded: DataTypes.BOOLEAN,
      cashStep: DataTypes.INTEGER,
      updatedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Shop", tableName: "shops", underscored: true, timestamps: false },
  );
}
