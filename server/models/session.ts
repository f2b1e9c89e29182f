import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";

/** A browser's session, written by the session store; the person's id stands beside it so that all can be ended. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare sid: string;
  declare personId: string | null;
  declare data: string;
  declare expires: Date;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Session.init(
  {
    sid: { type: DataTypes.TEXT, primaryKey: true },
    personId: { type: DataTypes.UUID, allowNull: true },
    data: { type: DataTypes.TEXT, allowNull: false },
    expires: { type: DataTypes.DATE, allowNull: false },
    createdAt: DataTypes.DATE,
    updatedAt: DataTypes.DATE,
  },
  { sequelize, tableName: "sessions", modelName: "Session", underscored: true },
);
