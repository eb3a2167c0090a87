import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** How many of a notion lie in a kit that is being packed. */
export class PackedNotion extends Model<InferAttributes<PackedNotion>, InferCreationAttributes<PackedNotion>> {
  declare runKitId: number;
  declare notionId: number;
  declare wanted: number;
  declare count: CreationOptional<number>;
}

export function definePackedNotion(sequelize: Sequelize): typeof PackedNotion {
  return class extends PackedNotion {}.init(
    {
      runKitId: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
      notionId: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
      wanted: { type: DataTypes.INTEGER, allowNull: false },
      count: DataTypes.INTEGER,
    },
    { sequelize, modelName: "PackedNotion", tableName: "packed_notions", underscored: true, timestamps: false },
  );
}

export function associatePackedNotion(models: Models): void {
  models.PackedNotion.belongsTo(models.Notion, { as: "notion", foreignKey: "notionId" });
  models.PackedNotion.belongsTo(models.RunKit, { as: "runKit", foreignKey: "runKitId" });
}
