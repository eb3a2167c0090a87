import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A till by name. */
export class Till extends Model<InferAttributes<Till>, InferCreationAttributes<Till>> {
  declare id: CreationOptional<number>;
  declare name: string;
}

export function defineTill(sequelize: Sequelize): typeof Till {
  return class extends Till {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      name: { type: DataTypes.TEXT, allowNull: false },
    },
    { sequelize, modelName: "Till", tableName: "tills", underscored: true, timestamps: false },
  );
}
