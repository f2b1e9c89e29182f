import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { MessageSummary } from "#shared/contracts/messages.ts";

/** A message to somebody: the data it is written from, never its text and never a token. */
export class Email extends Model<InferAttributes<Email>, InferCreationAttributes<Email>> {
  declare id: CreationOptional<string>;
  declare kind: string;
  declare toAddress: string;
  declare toName: string;
  /** Checked by the schema of its kind. */
  declare data: object;
  declare orderId: string | null;
  declare personId: string | null;
  declare state: CreationOptional<MessageSummary["state"]>;
  /** Message-ID header; the same through every try to send it. */
  declare messageId: string;
  /** One message for one event. */
  declare eventKey: string;
  declare attempts: CreationOptional<number>;
  declare lastError: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
}

Email.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    kind: { type: DataTypes.TEXT, allowNull: false },
    toAddress: { type: DataTypes.TEXT, allowNull: false },
    toName: { type: DataTypes.TEXT, allowNull: false },
    data: { type: DataTypes.JSONB, allowNull: false },
    orderId: { type: DataTypes.UUID, allowNull: true },
    personId: { type: DataTypes.UUID, allowNull: true },
    state: { type: DataTypes.TEXT, allowNull: false, defaultValue: "waiting" },
    messageId: { type: DataTypes.TEXT, allowNull: false },
    eventKey: { type: DataTypes.TEXT, allowNull: false },
    attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
    lastError: { type: DataTypes.TEXT, allowNull: true },
    createdAt: DataTypes.DATE,
    sentAt: { type: DataTypes.DATE, allowNull: true },
  },
  { sequelize, tableName: "emails", underscored: true, updatedAt: false },
);
