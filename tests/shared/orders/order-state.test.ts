import { describe, expect, it } from "vitest";
import { mayFollow, orderStateSchema, orderTransitions } from "#shared/orders/order-state.ts";

describe("order states", () => {
  it("begin with awaiting-payment, which nothing leads back to", () => {
    for (const from of orderStateSchema.options) expect(mayFollow(from, "awaiting-payment")).toBe(false);
  });

  it("end with delivered, declined and cancelled", () => {
    const ends = orderStateSchema.options.filter((state) => orderTransitions[state].length === 0);
    expect(ends.sort()).toEqual(["cancelled", "declined", "delivered"]);
  });

  it("can all be reached", () => {
    const reached = new Set(["awaiting-payment"]);
    for (let grown = true; grown;) {
      const before = reached.size;
      for (const from of orderStateSchema.options) {
        if (reached.has(from)) orderTransitions[from].forEach((to) => reached.add(to));
      }
      grown = reached.size > before;
    }
    expect([...reached].sort()).toEqual([...orderStateSchema.options].sort());
  });

  it("never let a declined order be accepted, nor an unpaid one", () => {
    expect(mayFollow("declined", "accepted")).toBe(false);
    expect(mayFollow("awaiting-payment", "accepted")).toBe(false);
    expect(mayFollow("placed", "accepted")).toBe(true);
  });
});
