import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { Build } from "#shared/catalogue/build.ts";

/** One build in a cart, with what one block cost when it was put there. */
export class CartLine extends Model<InferAttributes<CartLine>, InferCreationAttributes<CartLine>> {
  declare id: CreationOptional<string>;
  declare cartId: string;
  declare specCode: string;
  declare numbers: Build["numbers"];
  declare engraving: string;
  declare specialRequest: string;
  declare quantity: number;
  declare priceCents: number;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

CartLine.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    cartId: { type: DataTypes.UUID, allowNull: false },
    specCode: { type: DataTypes.TEXT, allowNull: false },
    numbers: { type: DataTypes.JSONB, allowNull: false },
    engraving: { type: DataTypes.TEXT, allowNull: false },
    specialRequest: { type: DataTypes.TEXT, allowNull: false },
    quantity: { type: DataTypes.INTEGER, allowNull: false },
    priceCents: { type: DataTypes.INTEGER, allowNull: false },
    createdAt: DataTypes.DATE,
    updatedAt: DataTypes.DATE,
  },
  { sequelize, tableName: "cart_lines", underscored: true },
);
