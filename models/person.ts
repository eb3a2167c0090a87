import { DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize } from "sequelize";
import type { Models } from "./database";

/** Who works here. A person signs in only while active. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<number>;
  declare name: string;
  declare email: string;
  declare passwordHash: CreationOptional<string | null>;
  declare roles: CreationOptional<string[]>;
  declare place: CreationOptional<string | null>;
  declare active: CreationOptional<boolean>;
  declare createdAt: CreationOptional<Date>;
}

export function definePerson(sequelize: Sequelize): typeof Person {
  return class extends Person {}.init(
    {
      id: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      email: { type: DataTypes.TEXT, allowNull: false },
      passwordHash: DataTypes.TEXT,
      roles: DataTypes.ARRAY(DataTypes.TEXT),
      place: DataTypes.TEXT,
      active: DataTypes.BOOLEAN,
      createdAt: DataTypes.DATE,
    },
    { sequelize, modelName: "Person", tableName: "people", underscored: true, timestamps: false },
  );
}

export function associatePerson(models: Models): void {
  models.Person.hasMany(models.Session, { as: "sessions", foreignKey: "personId" });
}
