import { transaction } from "#server/database/transaction.ts";
import { Cart } from "#server/models/cart.ts";
import { CartLine } from "#server/models/cart-line.ts";

/** At sign-in: a visitor's cart becomes the person's, its lines added to a cart the person already has. */
export async function adoptCart(personId: string, cartId: string): Promise<void> {
  await transaction(async () => {
    const visitors = await Cart.findOne({
      where: { id: cartId, personId: null, closedAt: null },
      lock: true,
    });
    if (!visitors) return;
    const own = await Cart.findOne({ where: { personId, closedAt: null }, lock: true });
    if (!own) {
      await visitors.update({ personId });
      return;
    }
    await CartLine.update({ cartId: own.id }, { where: { cartId: visitors.id } });
  });
}
