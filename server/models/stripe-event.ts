import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  QueryTypes,
} from "sequelize";
import { sequelize } from "#server/database/connection.ts";

/** An event of Stripe that was acted on; its id makes sure that it is acted on once. */
export class StripeEventRecord extends Model<
  InferAttributes<StripeEventRecord>,
  InferCreationAttributes<StripeEventRecord>
> {
  declare id: string;
  declare kind: string;
  declare outcome: string;
  declare paymentId: string | null;
  declare receivedAt: CreationOptional<Date>;

  /** Writes the event down; false when it was there before. Waits for a transaction that is just writing the same one. */
  static async claim(id: string, kind: string): Promise<boolean> {
    const rows = await sequelize.query(
      `INSERT INTO stripe_events (id, kind, outcome) VALUES (:id, :kind, '') ON CONFLICT (id) DO NOTHING RETURNING id`,
      { replacements: { id, kind }, type: QueryTypes.SELECT },
    );
    return rows.length === 1;
  }
}

StripeEventRecord.init(
  {
    id: { type: DataTypes.TEXT, primaryKey: true },
    kind: { type: DataTypes.TEXT, allowNull: false },
    outcome: { type: DataTypes.TEXT, allowNull: false },
    paymentId: { type: DataTypes.UUID, allowNull: true },
    receivedAt: { type: DataTypes.DATE, allowNull: false, defaultValue: DataTypes.NOW },
  },
  { sequelize, tableName: "stripe_events", underscored: true, timestamps: false },
);
