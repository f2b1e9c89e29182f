import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { Catalogue } from "#shared/catalogue/catalogue.ts";

/** A published catalogue document; the database refuses any change. */
export class CatalogueVersion extends Model<
  InferAttributes<CatalogueVersion>,
  InferCreationAttributes<CatalogueVersion>
> {
  declare version: number;
  declare document: Catalogue;
  declare publishedAt: CreationOptional<Date>;
}

CatalogueVersion.init(
  {
    version: { type: DataTypes.INTEGER, primaryKey: true },
    document: { type: DataTypes.JSONB, allowNull: false },
    publishedAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize, tableName: "catalogue_versions", underscored: true, timestamps: false },
);
