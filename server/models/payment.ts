import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";

/**
 * One try to be paid. `opening`: written down, the payment page is being asked for (its id is the idempotency key);
 * `open`: can be paid; `paid`; `expired`: can never be paid; `surplus`: paid though another was, goes back.
 */
export type PaymentState = "opening" | "open" | "paid" | "expired" | "surplus";

export class Payment extends Model<InferAttributes<Payment>, InferCreationAttributes<Payment>> {
  declare id: CreationOptional<string>;
  declare orderId: string;
  declare cartId: string;
  declare state: PaymentState;
  declare amountCents: number;
  declare currency: "USD";
  declare checkoutSession: CreationOptional<string | null>;
  declare paymentIntent: CreationOptional<string | null>;
  declare url: CreationOptional<string | null>;
  declare expiresAt: Date;
  declare paidAt: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
  declare updatedAt: CreationOptional<Date>;
}

Payment.init(
  {
    id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
    orderId: { type: DataTypes.UUID, allowNull: false },
    cartId: { type: DataTypes.UUID, allowNull: false },
    state: { type: DataTypes.TEXT, allowNull: false },
    amountCents: { type: DataTypes.INTEGER, allowNull: false },
    currency: { type: DataTypes.CHAR(3), allowNull: false },
    checkoutSession: { type: DataTypes.TEXT, allowNull: true },
    paymentIntent: { type: DataTypes.TEXT, allowNull: true },
    url: { type: DataTypes.TEXT, allowNull: true },
    expiresAt: { type: DataTypes.DATE, allowNull: false },
    paidAt: { type: DataTypes.DATE, allowNull: true },
    createdAt: DataTypes.DATE,
    updatedAt: DataTypes.DATE,
  },
  { sequelize, tableName: "payments", underscored: true },
);
