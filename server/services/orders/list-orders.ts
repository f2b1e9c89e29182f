import { Op, QueryTypes, type WhereOptions } from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import { Order } from "#server/models/order.ts";
import { OrderLine } from "#server/models/order-line.ts";
import { Person } from "#server/models/person.ts";
import type { OrderListQuery } from "#shared/contracts/orders.ts";

const PAGE = 25;

/** An order as a row of a list. */
export interface OrderRow {
  order: Order;
  lines: Pick<OrderLine, "quantity" | "specialRequest" | "build">[];
  openedByName: string | null;
}

/** One page of the shop's orders in a state, oldest first; `search` looks in number, name, e-mail and build. */
export async function listOrders(
  query: OrderListQuery,
): Promise<{ rows: OrderRow[]; total: number; pages: number }> {
  const words = query.search.toLowerCase().split(/\s+/).filter(Boolean);
  const where: WhereOptions<Order> = {
    state: query.state,
    [Op.and]: words.map((word) => ({ searchText: { [Op.like]: `%${word.replace(/[\\%_]/g, "\\$&")}%` } })),
  };
  const total = await Order.count({ where });
  const orders = await Order.findAll({
    where,
    order: [
      ["placedAt", "ASC"],
      ["id", "ASC"],
    ],
    limit: PAGE,
    offset: (query.page - 1) * PAGE,
  });
  return { rows: await withLines(orders), total, pages: Math.max(1, Math.ceil(total / PAGE)) };
}

/** A person's own orders, newest first: those bought signed in, and those bought as a guest with the same, verified address. */
export async function listMyOrders(person: {
  id: string;
  email: string;
  emailVerified: boolean;
}): Promise<OrderRow[]> {
  const rows = await sequelize.query<{ id: string }>(
    `SELECT id FROM orders
      WHERE placed_at IS NOT NULL
        AND (person_id = :id OR (:verified AND person_id IS NULL AND lower(contact_email) = lower(:email)))
      ORDER BY placed_at DESC LIMIT 200`,
    {
      replacements: { id: person.id, email: person.email, verified: person.emailVerified },
      type: QueryTypes.SELECT,
    },
  );
  const orders = await Order.findAll({
    where: { id: rows.map((row) => row.id) },
    order: [["placedAt", "DESC"]],
  });
  return withLines(orders);
}

async function withLines(orders: Order[]): Promise<OrderRow[]> {
  const lines = await OrderLine.findAll({
    where: { orderId: orders.map((order) => order.id) },
    attributes: ["orderId", "quantity", "specialRequest", "build"],
    order: [["position", "ASC"]],
  });
  const openers = orders.map((order) => order.openedBy).filter((id) => id !== null);
  const people = await Person.findAll({ where: { id: openers }, attributes: ["id", "name"] });
  const names = new Map(people.map((person) => [person.id, person.name]));
  return orders.map((order) => ({
    order,
    lines: lines.filter((line) => line.orderId === order.id),
    openedByName: order.openedBy === null ? null : (names.get(order.openedBy) ?? null),
  }));
}
