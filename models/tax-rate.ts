import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** A tax rate by class of goods and date, in 1/10 000 of a percent. */
export class TaxRate extends Model<InferAttributes<TaxRate>, InferCreationAttributes<TaxRate>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare goods: "fabric" | "kit" | "notion";
  declare rate: number;
  declare validFrom: string;
  declare validTo: CreationOptional<string | null>;
}

export function defineTaxRate(sequelize: Sequelize): typeof TaxRate {
  return class extends TaxRate {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      goods: { type: DataTypes.TEXT, allowNull: false },
      rate: { type: DataTypes.INTEGER, allowNull: false },
      validFrom: { type: DataTypes.DATEONLY, allowNull: false },
      validTo: DataTypes.DATEONLY,
    },
    { sequelize, modelName: "TaxRate", tableName: "tax_rates", underscored: true, timestamps: false },
  );
}
