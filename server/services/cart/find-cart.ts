import { Cart } from "#server/models/cart.ts";
import { CartLine } from "#server/models/cart-line.ts";
import type { Actor } from "#server/policies/actor.ts";

/** Whose cart is meant: a person's open one, or a visitor's by the id that the session holds. */
export interface CartHolder {
  personId: string | null;
  cartId: string | null;
}

/** The holder that an actor is. */
export function holderOf(actor: Actor): CartHolder {
  return { personId: actor.person?.id ?? null, cartId: actor.cartId };
}

/** The holder's open cart; null when there is none (a cart that was paid is closed). */
export async function findCart(holder: CartHolder): Promise<Cart | null> {
  if (holder.personId !== null) return Cart.findOne({ where: { personId: holder.personId, closedAt: null } });
  if (holder.cartId === null) return null;
  return Cart.findOne({ where: { id: holder.cartId, personId: null, closedAt: null } });
}

/** How many blocks the holder's cart has. */
export async function countCart(holder: CartHolder): Promise<number> {
  const cart = await findCart(holder);
  if (!cart) return 0;
  return (await CartLine.sum("quantity", { where: { cartId: cart.id } })) || 0;
}
