import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A block; what is drawn lies in its versions. */
export class Block extends Model<InferAttributes<Block>, InferCreationAttributes<Block>> {
  declare id: CreationOptional<number>;
  declare slug: string;
  declare name: string;
  declare traditional: CreationOptional<boolean>;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
  declare archivedAt: CreationOptional<Date | null>;
}

export function defineBlock(sequelize: Sequelize): typeof Block {
  return class extends Block {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      slug: { type: DataTypes.TEXT, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      traditional: DataTypes.BOOLEAN,
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
      archivedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Block", tableName: "blocks", underscored: true, timestamps: false },
  );
}

export function associateBlock(models: Models): void {
  models.Block.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.Block.hasMany(models.BlockVersion, { as: "versions", foreignKey: "blockId" });
}
