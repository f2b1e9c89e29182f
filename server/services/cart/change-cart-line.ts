import { transaction } from "#server/database/transaction.ts";
import { Cart } from "#server/models/cart.ts";
import { CartLine } from "#server/models/cart-line.ts";
import { Refusal } from "#server/services/refusal.ts";
import { type CartHolder, findCart } from "./find-cart.ts";

/**
 * Sets how many blocks a line of the holder's own cart asks for.
 * @throws Refusal not-found for a line that is not in it
 */
export async function changeCartLine(holder: CartHolder, lineId: string, quantity: number): Promise<void> {
  await transaction(async () => {
    const line = await lockLine(holder, lineId);
    await line.update({ quantity });
  });
}

/**
 * Takes a line out of the holder's own cart.
 * @throws Refusal not-found for a line that is not in it
 */
export async function removeCartLine(holder: CartHolder, lineId: string): Promise<void> {
  await transaction(async () => {
    const line = await lockLine(holder, lineId);
    await line.destroy();
  });
}

async function lockLine(holder: CartHolder, lineId: string): Promise<CartLine> {
  const cart = await findCart(holder);
  // The cart is locked first, as placing an order does, so that an order never takes half a change.
  if (cart) await Cart.findByPk(cart.id, { lock: true });
  const line = cart ? await CartLine.findOne({ where: { id: lineId, cartId: cart.id } }) : null;
  if (!line) throw new Refusal("not-found", "This line is no longer in the cart.");
  return line;
}
