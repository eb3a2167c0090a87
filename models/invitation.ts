import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** A link by e-mail to join or to choose a new password; only the hash of its token is kept. */
export class Invitation extends Model<InferAttributes<Invitation>, InferCreationAttributes<Invitation>> {
  declare id: CreationOptional<number>;
  declare personId: number;
  declare tokenHash: string;
  declare purpose: "join" | "new-password";
  declare madeBy: CreationOptional<number | null>;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
}

export function defineInvitation(sequelize: Sequelize): typeof Invitation {
  return class extends Invitation {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      personId: { type: DataTypes.INTEGER, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      purpose: { type: DataTypes.TEXT, allowNull: false },
      madeBy: DataTypes.INTEGER,
      createdAt: DataTypes.DATE,
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      usedAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Invitation", tableName: "invitations", underscored: true, timestamps: false },
  );
}

export function associateInvitation(models: Models): void {
  models.Invitation.belongsTo(models.Person, { as: "maker", foreignKey: "madeBy" });
  models.Invitation.belongsTo(models.Person, { as: "person", foreignKey: "personId" });
}
