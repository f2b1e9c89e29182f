import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { Address } from "#shared/contracts/address.ts";

/** The one row that says whose shop this is; the letterhead comes from it. */
export class ShopSettings extends Model<
  InferAttributes<ShopSettings>,
  InferCreationAttributes<ShopSettings>
> {
  declare singleRow: CreationOptional<boolean>;
  declare name: string;
  declare email: string;
  /** E.164. */
  declare phone: string;
  declare address: Address;
  /** IANA name; the shop's days and hours are in it. */
  declare timeZone: string;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

ShopSettings.init(
  {
    singleRow: { type: DataTypes.BOOLEAN, primaryKey: true, defaultValue: true },
    name: { type: DataTypes.TEXT, allowNull: false },
    email: { type: DataTypes.TEXT, allowNull: false },
    phone: { type: DataTypes.TEXT, allowNull: false },
    address: { type: DataTypes.JSONB, allowNull: false },
    timeZone: { type: DataTypes.TEXT, allowNull: false },
    createdAt: DataTypes.DATE,
    updatedAt: DataTypes.DATE,
  },
  { sequelize, tableName: "shop_settings", underscored: true },
);
