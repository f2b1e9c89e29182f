import { transaction } from "#server/database/transaction.ts";
import { Cart } from "#server/models/cart.ts";
import { CartLine } from "#server/models/cart-line.ts";
import { requireOrderable } from "#server/services/builds/check-build.ts";
import { Refusal } from "#server/services/refusal.ts";
import type { AddCartLineRequest } from "#shared/contracts/cart.ts";
import { formatCents } from "#shared/money/cents.ts";
import { type CartHolder, findCart } from "./find-cart.ts";

const MOST_LINES = 50;

/**
 * Puts a build in the cart, making the cart when there is none.
 * @returns the cart's id, for the session to hold
 * @throws Refusal build-refused when it cannot be ordered, price-changed when the browser saw another price
 */
export async function addCartLine(holder: CartHolder, request: AddCartLineRequest): Promise<string> {
  const checked = await requireOrderable(request);
  if (checked.view.priceCents !== request.expectedPriceCents) {
    throw new Refusal(
      "price-changed",
      `This block is ${formatCents(checked.view.priceCents)} today; the page showed ${formatCents(request.expectedPriceCents)}. Look at the new price and try again.`,
      { extra: { priceCents: checked.view.priceCents } },
    );
  }
  return transaction(async () => {
    const cart = (await findCart(holder)) ?? (await Cart.create({ personId: holder.personId }));
    const lines = await CartLine.count({ where: { cartId: cart.id } });
    if (lines >= MOST_LINES)
      throw new Refusal("conflict", `A cart holds at most ${MOST_LINES} lines. Order these first.`);
    await CartLine.create({
      cartId: cart.id,
      specCode: checked.view.specCode,
      numbers: checked.build.numbers,
      engraving: request.engraving,
      specialRequest: request.specialRequest,
      quantity: request.quantity,
      priceCents: checked.view.priceCents,
    });
    return cart.id;
  });
}
