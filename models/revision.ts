import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** How often what a topic names has changed. */
export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  declare topic: string;
  declare revision: CreationOptional<number>;
}

export function defineRevision(sequelize: Sequelize): typeof Revision {
  return class extends Revision {}.init(
    {
      topic: { type: DataTypes.TEXT, primaryKey: true, allowNull: false },
      revision: DataTypes.BIGINT,
    },
    { sequelize, modelName: "Revision", tableName: "revisions", underscored: true, timestamps: false },
  );
}
