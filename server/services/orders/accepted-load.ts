import { QueryTypes } from "sequelize";
import { sequelize } from "#server/database/connection.ts";
import type { Load } from "#shared/scheduling/estimate.ts";

/** Minutes that accepted orders still need at each work centre: what a new block stands behind. */
export async function acceptedLoad(): Promise<Load> {
  const rows = await sequelize.query<{ centre: string; minutes: number }>(
    `SELECT entry.key AS centre, sum(entry.value::integer * line.quantity)::integer AS minutes
       FROM orders
       JOIN order_lines AS line ON line.order_id = orders.id
       CROSS JOIN LATERAL jsonb_each_text(line.build -> 'minutes') AS entry
      WHERE orders.state IN ('accepted', 'in-work')
      GROUP BY entry.key`,
    { type: QueryTypes.SELECT },
  );
  return { minutes: Object.fromEntries(rows.map((row) => [row.centre, row.minutes])) };
}
