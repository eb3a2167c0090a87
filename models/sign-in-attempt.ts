import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";

/** Each try to sign in, for the limits. */
export class SignInAttempt extends Model<InferAttributes<SignInAttempt>, InferCreationAttributes<SignInAttempt>> {
  declare id: CreationOptional<number>;
  declare email: string;
  declare address: string;
  declare succeeded: boolean;
  declare at: CreationOptional<Date>;
}

export function defineSignInAttempt(sequelize: Sequelize): typeof SignInAttempt {
  return class extends SignInAttempt {}.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      email: { type: DataTypes.TEXT, allowNull: false },
      address: { type: DataTypes.TEXT, allowNull: false },
      succeeded: { type: DataTypes.BOOLEAN, allowNull: false },
      at: DataTypes.DATE,
    },
    { sequelize, modelName: "SignInAttempt", tableName: "sign_in_attempts", underscored: true, timestamps: false },
  );
}
