import { DataTypes, type InferAttributes, type InferCreationAttributes, Model } from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { PriceList } from "#shared/pricing/price-list.ts";

/** A published price list and the day from which it holds; the database refuses any change. */
export class PriceListVersion extends Model<
  InferAttributes<PriceListVersion>,
  InferCreationAttributes<PriceListVersion>
> {
  declare version: number;
  declare document: PriceList;
  /** ISO date in the shop's calendar. */
  declare effectiveOn: string;
}

PriceListVersion.init(
  {
    version: { type: DataTypes.INTEGER, primaryKey: true },
    document: { type: DataTypes.JSONB, allowNull: false },
    effectiveOn: { type: DataTypes.DATEONLY, allowNull: false },
  },
  { sequelize, tableName: "price_list_versions", underscored: true, timestamps: false },
);
