import type { PersonView, Role } from "#shared/contracts/person.ts";

/** Who asks. `person` is null for a visitor. */
export interface Actor {
  person: PersonView | null;
  /** Orders that this browser may see without an account: opened by a mailed link, or bought here as a guest. */
  orderGrants: readonly string[];
  /** A visitor's cart. */
  cartId: string | null;
}

/** The office may do all that planners may, planners all that the floor may. */
const includes: Record<Role, readonly Role[]> = {
  customer: ["customer"],
  dealer: ["dealer"],
  floor: ["floor"],
  planner: ["planner", "floor"],
  office: ["office", "planner", "floor"],
};

export function hasRole(actor: Actor, roles: readonly Role[]): boolean {
  const { person } = actor;
  return person !== null && roles.some((role) => includes[person.role].includes(role));
}
