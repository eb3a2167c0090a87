import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** Whom fabric is bought from. */
export class Supplier extends Model<InferAttributes<Supplier>, InferCreationAttributes<Supplier>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare email: CreationOptional<string>;
}

export function defineSupplier(sequelize: Sequelize): typeof Supplier {
  return class extends Supplier {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      email: DataTypes.TEXT,
    },
    { sequelize, modelName: "Supplier", tableName: "suppliers", underscored: true, timestamps: false },
  );
}
