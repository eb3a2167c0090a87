import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** Which station has a bolt in hand. */
export class Claim extends Model<InferAttributes<Claim>, InferCreationAttributes<Claim>> {
  declare boltId: number;
  declare station: string;
  declare personId: number;
  declare runId: CreationOptional<number | null>;
  declare claimedAt: CreationOptional<Date>;
}

export function defineClaim(sequelize: Sequelize): typeof Claim {
  return class extends Claim {}.init(
    {
      boltId: { type: DataTypes.INTEGER, primaryKey: true, allowNull: false },
      station: { type: DataTypes.TEXT, allowNull: false },
      personId: { type: DataTypes.INTEGER, allowNull: false },
      runId: DataTypes.INTEGER,
      claimedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Claim", tableName: "claims", underscored: true, timestamps: false },
  );
}

export function associateClaim(models: Models): void {
  models.Claim.belongsTo(models.Bolt, { as: "bolt", foreignKey: "boltId" });
  models.Claim.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
  models.Claim.belongsTo(models.Run, { as: "run", foreignKey: "runId" });
}
