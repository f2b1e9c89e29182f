import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { OrderState } from "#shared/orders/order-state.ts";

/** One row of an order's history; never changed or deleted. */
export class OrderEvent extends Model<InferAttributes<OrderEvent>, InferCreationAttributes<OrderEvent>> {
  declare id: CreationOptional<string>;
  declare orderId: string;
  declare sequence: CreationOptional<string>;
  declare at: CreationOptional<Date>;
  declare state: OrderState;
  declare text: string;
  declare personId: string | null;
}

OrderEvent.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    orderId: { type: DataTypes.UUID, allowNull: false },
    sequence: { type: DataTypes.BIGINT },
    at: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
    state: { type: DataTypes.TEXT, allowNull: false },
    text: { type: DataTypes.TEXT, allowNull: false },
    personId: { type: DataTypes.UUID, allowNull: true },
  },
  { sequelize, tableName: "order_history", underscored: true, timestamps: false },
);
