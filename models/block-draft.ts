import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** What a person has drawn of a block and not yet saved as a version. */
export class BlockDraft extends Model<InferAttributes<BlockDraft>, InferCreationAttributes<BlockDraft>> {
  declare blockId: number;
  declare personId: number;
  declare revision: CreationOptional<number>;
  declare drawing: object;
  declare width: number;
  declare height: number;
  declare roles: object;
  declare basedOn: CreationOptional<number | null>;
  declare savedAt: CreationOptional<Date>;
}

export function defineBlockDraft(sequelize: Sequelize): typeof BlockDraft {
  return class extends BlockDraft {}.init(
    {
      blockId: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
      personId: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
      revision: DataTypes.INTEGER,
      drawing: { type: DataTypes.JSONB, allowNull: false },
      width: { type: DataTypes.INTEGER, allowNull: false },
      height: { type: DataTypes.INTEGER, allowNull: false },
      roles: { type: DataTypes.JSONB, allowNull: false },
      basedOn: DataTypes.INTEGER,
      savedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "BlockDraft", tableName: "block_drafts", underscored: true, timestamps: false },
  );
}

export function associateBlockDraft(models: Models): void {
  models.BlockDraft.belongsTo(models.BlockVersion, { as: "basedOnVersion", foreignKey: "basedOn" });
  models.BlockDraft.belongsTo(models.Block, { as: "block", foreignKey: "blockId" });
  models.BlockDraft.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
}
