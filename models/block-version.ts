import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** An immutable version of a block; lengths in 1/160 mm. */
export class BlockVersion extends Model<InferAttributes<BlockVersion>, InferCreationAttributes<BlockVersion>> {
  declare id: CreationOptional<number>;
  declare blockId: number;
  declare version: number;
  declare name: string;
  declare drawing: object;
  declare width: number;
  declare height: number;
  declare roles: object;
  declare coreVersion: string;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
}

export function defineBlockVersion(sequelize: Sequelize): typeof BlockVersion {
  return class extends BlockVersion {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      blockId: { type: DataTypes.INTEGER, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      drawing: { type: DataTypes.JSONB, allowNull: false },
      width: { type: DataTypes.INTEGER, allowNull: false },
      height: { type: DataTypes.INTEGER, allowNull: false },
      roles: { type: DataTypes.JSONB, allowNull: false },
      coreVersion: { type: DataTypes.TEXT, allowNull: false },
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "BlockVersion", tableName: "block_versions", underscored: true, timestamps: false },
  );
}

export function associateBlockVersion(models: Models): void {
  models.BlockVersion.belongsTo(models.Block, { as: "block", foreignKey: "blockId" });
  models.BlockVersion.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
}
