import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { Address, Delivery } from "#shared/contracts/address.ts";
import type { OrderState } from "#shared/orders/order-state.ts";

/** One order with its frozen versions and amounts. Its state changes only through the functions of services/orders. */
export class Order extends Model<InferAttributes<Order>, InferCreationAttributes<Order>> {
  declare id: CreationOptional<string>;
  declare number: string;
  declare cartId: string;
  declare personId: string | null;
  declare state: OrderState;
  declare contactName: string;
  declare contactEmail: string;
  declare contactPhone: string;
  declare deliveryMethod: Delivery["method"];
  declare deliveryAddress: Address | null;
  declare catalogueVersion: number;
  declare priceListVersion: number;
  declare currency: "USD";
  declare goodsCents: number;
  declare freightCents: number;
  declare taxCents: number;
  declare totalCents: number;
  declare taxLabel: string;
  declare taxCalculation: string;
  /** Of everything that was agreed; two requests with the same hash are the same order. */
  declare contentHash: string;
  /** Lower-case words that the queue's search looks through. */
  declare searchText: string;
  declare estimatedShipOn: string;
  declare promisedShipOn: CreationOptional<string | null>;
  declare declineReason: CreationOptional<string | null>;
  declare placedAt: CreationOptional<Date | null>;
  declare openedBy: CreationOptional<string | null>;
  declare openedAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Order.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    number: { type: DataTypes.TEXT, allowNull: false },
    cartId: { type: DataTypes.UUID, allowNull: false },
    personId: { type: DataTypes.UUID, allowNull: true },
    state: { type: DataTypes.TEXT, allowNull: false },
    contactName: { type: DataTypes.TEXT, allowNull: false },
    contactEmail: { type: DataTypes.TEXT, allowNull: false },
    contactPhone: { type: DataTypes.TEXT, allowNull: false },
    deliveryMethod: { type: DataTypes.TEXT, allowNull: false },
    deliveryAddress: { type: DataTypes.JSONB, allowNull: true },
    catalogueVersion: { type: DataTypes.INTEGER, allowNull: false },
    priceListVersion: { type: DataTypes.INTEGER, allowNull: false },
    currency: { type: DataTypes.CHAR(3), allowNull: false },
    goodsCents: { type: DataTypes.INTEGER, allowNull: false },
    freightCents: { type: DataTypes.INTEGER, allowNull: false },
    taxCents: { type: DataTypes.INTEGER, allowNull: false },
    totalCents: { type: DataTypes.INTEGER, allowNull: false },
    taxLabel: { type: DataTypes.TEXT, allowNull: false },
    taxCalculation: { type: DataTypes.TEXT, allowNull: false },
    contentHash: { type: DataTypes.TEXT, allowNull: false },
    searchText: { type: DataTypes.TEXT, allowNull: false },
    estimatedShipOn: { type: DataTypes.DATEONLY, allowNull: false },
    promisedShipOn: { type: DataTypes.DATEONLY, allowNull: true },
    declineReason: { type: DataTypes.TEXT, allowNull: true },
    placedAt: { type: DataTypes.DATE, allowNull: true },
    openedBy: { type: DataTypes.UUID, allowNull: true },
    openedAt: { type: DataTypes.DATE, allowNull: true },
    createdAt: DataTypes.DATE,
    updatedAt: DataTypes.DATE,
  },
  { sequelize, tableName: "orders", underscored: true },
);
