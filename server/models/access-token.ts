import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";

export type TokenPurpose = "verify-email" | "reset-password" | "order-link";

/** What a mailed link allows. Only the hash of its token is kept. */
export class AccessToken extends Model<InferAttributes<AccessToken>, InferCreationAttributes<AccessToken>> {
  declare id: CreationOptional<string>;
  declare purpose: TokenPurpose;
  /** SHA-256 of the token, hexadecimal. */
  declare tokenHash: string;
  declare personId: CreationOptional<string | null>;
  declare orderId: CreationOptional<string | null>;
  /** Null: its end is not known yet (a link to an order that is not delivered). */
  declare expiresAt: CreationOptional<Date | null>;
  declare usedAt: CreationOptional<Date | null>;
  declare revokedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}

AccessToken.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    purpose: { type: DataTypes.TEXT, allowNull: false },
    tokenHash: { type: DataTypes.TEXT, allowNull: false },
    personId: { type: DataTypes.UUID, allowNull: true },
    orderId: { type: DataTypes.UUID, allowNull: true },
    expiresAt: { type: DataTypes.DATE, allowNull: true },
    usedAt: { type: DataTypes.DATE, allowNull: true },
    revokedAt: { type: DataTypes.DATE, allowNull: true },
    createdAt: DataTypes.DATE,
  },
  { sequelize, tableName: "access_tokens", underscored: true, updatedAt: false },
);
