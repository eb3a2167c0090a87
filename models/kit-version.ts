import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** An immutable version of a kit design. */
export class KitVersion extends Model<InferAttributes<KitVersion>, InferCreationAttributes<KitVersion>> {
  declare id: CreationOptional<number>;
  declare kitDesignId: number;
  declare version: number;
  declare name: string;
  declare quiltVersionId: number;
  declare format: CreationOptional<"lengths" | "fat-quarters" | "pre-cut">;
  declare allowance: object;
  declare rules: object;
  declare notions: CreationOptional<object>;
  declare labourMinutes: CreationOptional<number>;
  declare sheetCost: CreationOptional<number>;
  declare smallParts: CreationOptional<boolean>;
  declare coreVersion: string;
  declare madeBy: CreationOptional<number | null>;
  declare madeAt: CreationOptional<Date>;
}

export function defineKitVersion(sequelize: Sequelize): typeof KitVersion {
  return class extends KitVersion {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      kitDesignId: { type: DataTypes.INTEGER, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      quiltVersionId: { type: DataTypes.INTEGER, allowNull: false },
      format: DataTypes.TEXT,
      allowance: { type: DataTypes.JSONB, allowNull: false },
      rules: { type: DataTypes.JSONB, allowNull: false },
      notions: DataTypes.JSONB,
      labourMinutes: DataTypes.INTEGER,
      sheetCost: DataTypes.INTEGER,
      smallParts: DataTypes.BOOLEAN,
      coreVersion: { type: DataTypes.TEXT, allowNull: false },
      madeBy: DataTypes.INTEGER,
      madeAt: DataTypes.DATE,
    },
    { sequelize, modelName: "KitVersion", tableName: "kit_versions", underscored: true, timestamps: false },
  );
}

export function associateKitVersion(models: Models): void {
  models.KitVersion.belongsTo(models.KitDesign, { as: "kitDesign", foreignKey: "kitDesignId" });
  models.KitVersion.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.KitVersion.belongsTo(models.QuiltVersion, { as: "quiltVersion", foreignKey: "quiltVersionId" });
  models.KitVersion.hasMany(models.Colourway, { as: "colourways", foreignKey: "kitVersionId" });
}
