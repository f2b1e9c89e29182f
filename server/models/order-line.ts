import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { Build } from "#shared/catalogue/build.ts";
import type { BuildView } from "#shared/contracts/build.ts";

/** One build of an order, frozen as it was agreed. */
export class OrderLine extends Model<InferAttributes<OrderLine>, InferCreationAttributes<OrderLine>> {
  declare id: CreationOptional<string>;
  declare orderId: string;
  declare position: number;
  declare specCode: string;
  declare numbers: Build["numbers"];
  declare engraving: string;
  declare specialRequest: string;
  declare specialRequestAnswer: CreationOptional<string>;
  declare quantity: number;
  declare unitCents: number;
  declare totalCents: number;
  declare build: BuildView;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

OrderLine.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    orderId: { type: DataTypes.UUID, allowNull: false },
    position: { type: DataTypes.INTEGER, allowNull: false },
    specCode: { type: DataTypes.TEXT, allowNull: false },
    numbers: { type: DataTypes.JSONB, allowNull: false },
    engraving: { type: DataTypes.TEXT, allowNull: false },
    specialRequest: { type: DataTypes.TEXT, allowNull: false },
    specialRequestAnswer: { type: DataTypes.TEXT, allowNull: false, defaultValue: "" },
    quantity: { type: DataTypes.INTEGER, allowNull: false },
    unitCents: { type: DataTypes.INTEGER, allowNull: false },
    totalCents: { type: DataTypes.INTEGER, allowNull: false },
    build: { type: DataTypes.JSONB, allowNull: false },
    createdAt: DataTypes.DATE,
    updatedAt: DataTypes.DATE,
  },
  { sequelize, tableName: "order_lines", underscored: true },
);
