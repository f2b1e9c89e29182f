import { CartLine } from "#server/models/cart-line.ts";
import { checkBuild } from "#server/services/builds/check-build.ts";
import type { CartView } from "#shared/contracts/cart.ts";
import { type CartHolder, findCart } from "./find-cart.ts";

/** The holder's cart at today's prices; lines that can no longer be made stand apart with the reason. */
export async function readCart(holder: CartHolder): Promise<CartView> {
  const cart = await findCart(holder);
  const rows = cart
    ? await CartLine.findAll({ where: { cartId: cart.id }, order: [["createdAt", "ASC"]] })
    : [];
  const view: CartView = { lines: [], refused: [], totalCents: 0, blocks: 0 };
  for (const row of rows) {
    const checked = await checkBuild(row);
    if (!checked.ok) {
      const reason = checked.problems.map((problem) => problem.message).join(" ");
      view.refused.push({ id: row.id, specCode: row.specCode, reason });
      continue;
    }
    const totalCents = checked.view.priceCents * row.quantity;
    view.lines.push({
      id: row.id,
      quantity: row.quantity,
      engraving: row.engraving,
      specialRequest: row.specialRequest,
      build: checked.view,
      earlierPriceCents: row.priceCents === checked.view.priceCents ? null : row.priceCents,
      totalCents,
    });
    view.totalCents += totalCents;
    view.blocks += row.quantity;
  }
  return view;
}
