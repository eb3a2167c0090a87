import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A finished plan under the hash of its input and the version of the core. */
export class Plan extends Model<InferAttributes<Plan>, InferCreationAttributes<Plan>> {
  declare inputHash: string;
  declare coreVersion: string;
  declare kind: "kit" | "bolts";
  declare input: object;
  declare result: object;
  declare madeAt: CreationOptional<Date>;
}

export function definePlan(sequelize: Sequelize): typeof Plan {
  return class extends Plan {}.init(
    {
      inputHash: { type: DataTypes.TEXT, primaryKey: true, allowNull: false },
      coreVersion: { type: DataTypes.TEXT, primaryKey: true, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false },
      input: { type: DataTypes.JSONB, allowNull: false },
      result: { type: DataTypes.JSONB, allowNull: false },
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Plan", tableName: "plans", underscored: true, timestamps: false },
  );
}
