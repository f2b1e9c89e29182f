import { definePolicy } from "./policy.ts";

/** What a policy must know of an order to say whose it is. */
interface OrderOwnership {
  id: string;
  personId: string | null;
  contactEmail: string;
}

/** The buyer, a browser that opened the mailed link or bought it as a guest, and the shop. */
export const readOrders = definePolicy<OrderOwnership>({
  action: "orders.read",
  roles: ["floor"],
  others: "anyone",
  owns: ({ person, orderGrants }, order) =>
    orderGrants.includes(order.id) ||
    (person !== null && order.personId === person.id) ||
    // An order bought as a guest belongs to whoever has proved that its address is theirs.
    (person !== null &&
      person.emailVerified &&
      order.personId === null &&
      order.contactEmail.toLowerCase() === person.email.toLowerCase()),
});

export const reviewOrders = definePolicy({ action: "orders.review", roles: ["floor"] });
export const acceptOrders = definePolicy({ action: "orders.accept", roles: ["planner"] });
export const declineOrders = definePolicy({ action: "orders.decline", roles: ["planner"] });
