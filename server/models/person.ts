import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { Role } from "#shared/contracts/person.ts";

/** Somebody with an account. `email` is kept as it was written; two accounts never differ by its case alone. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<string>;
  declare name: string;
  declare email: string;
  /** PHC string of argon2id. */
  declare passwordHash: string;
  declare role: Role;
  declare emailVerifiedAt: CreationOptional<Date | null>;
  declare disabledAt: CreationOptional<Date | null>;
  /** Sessions that began earlier are over, even if one of their requests is still under way. */
  declare sessionsValidFrom: CreationOptional<Date>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Person.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    name: { type: DataTypes.TEXT, allowNull: false },
    email: { type: DataTypes.TEXT, allowNull: false },
    passwordHash: { type: DataTypes.TEXT, allowNull: false },
    role: { type: DataTypes.TEXT, allowNull: false },
    emailVerifiedAt: { type: DataTypes.DATE, allowNull: true },
    disabledAt: { type: DataTypes.DATE, allowNull: true },
    sessionsValidFrom: { type: DataTypes.DATE, allowNull: false, defaultValue: new Date(0) },
    createdAt: DataTypes.DATE,
    updatedAt: DataTypes.DATE,
  },
  { sequelize, tableName: "people", underscored: true },
);
