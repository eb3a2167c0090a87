import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** Anything counted: thread, zips, patterns. Prices in minor units. */
export class Notion extends Model<InferAttributes<Notion>, InferCreationAttributes<Notion>> {
  declare id: CreationOptional<number>;
  declare number: string;
  declare gtin: CreationOptional<string | null>;
  declare name: string;
  declare price: number;
  declare cost: number;
  declare onHand: CreationOptional<number>;
}

export function defineNotion(sequelize: Sequelize): typeof Notion {
  return class extends Notion {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      number: { type: DataTypes.TEXT, allowNull: false },
      gtin: DataTypes.TEXT,
      name: { type: DataTypes.TEXT, allowNull: false },
      price: { type: DataTypes.INTEGER, allowNull: false },
      cost: { type: DataTypes.INTEGER, allowNull: false },
      onHand: DataTypes.INTEGER,
    },
    { sequelize, modelName: "Notion", tableName: "notions", underscored: true, timestamps: false },
  );
}
