import type { BuildView } from "#shared/contracts/build.ts";
import type { CartView } from "#shared/contracts/cart.ts";
import type { Totals } from "#shared/contracts/checkout.ts";
import type { OrderReview } from "#shared/contracts/orders.ts";
import type { SessionView } from "#shared/contracts/session.ts";

export const lineId = "5f0c6a52-8a31-4d0e-9f4c-0d5c2f4f7a10";

export function buildView(changes: Partial<BuildView> = {}): BuildView {
  return {
    specCode: "0104-TEST",
    catalogueVersion: 1,
    priceListVersion: 1,
    family: "Marl",
    summary: "Marl, 4.125 in bore, 9.025 in deck",
    answers: [{ step: "Casting", choice: "Family", option: "Marl" }],
    numbers: { powerAim: "450" },
    figures: [{ id: "web", name: "Web between bores", unit: "in", value: 0.275, places: 4 }],
    findings: [{ rule: "thin-wall", severity: "caution", sentence: "The wall is thin.", undecided: false }],
    priceLines: [{ kind: "base", label: "Marl", amountCents: 248_100 }],
    priceCents: 248_100,
    weight: 180,
    minutes: {},
    leadDays: 0,
    shipsOn: "2027-01-22",
    ...changes,
  };
}

export function cartView(changes: Partial<CartView["lines"][number]> = {}): CartView {
  const line = {
    id: lineId,
    quantity: 1,
    engraving: "",
    specialRequest: "",
    build: buildView(),
    earlierPriceCents: null,
    totalCents: 248_100,
    ...changes,
  };
  return { lines: [line], refused: [], totalCents: line.totalCents, blocks: line.quantity };
}

export function totals(taxCents = 14_266): Totals {
  const totalCents = 248_100 + 26_500 + taxCents;
  return {
    currency: "USD",
    lines: [
      { kind: "block", label: "Marl, 4.125 in bore, 9.025 in deck", quantity: 1, amountCents: 248_100 },
      { kind: "freight", label: "Freight to OH 43604", quantity: 1, amountCents: 26_500 },
      { kind: "tax", label: "OH sales tax", quantity: 1, amountCents: taxCents },
    ],
    goodsCents: 248_100,
    freightCents: 26_500,
    taxCents,
    totalCents,
  };
}

export function sessionView(changes: Partial<SessionView> = {}): SessionView {
  return {
    csrfToken: "a token of the test",
    person: null,
    cartCount: 1,
    shop: {
      name: "The shop",
      email: "shop@example.com",
      phone: "+13135550100",
      addressLines: ["1 Foundry Row"],
      timeZone: "America/New_York",
    },
    demo: null,
    ...changes,
  };
}

export function orderReview(changes: Partial<OrderReview> = {}): OrderReview {
  return {
    number: "K7Q4-M2XD",
    state: "placed",
    placedAt: "2026-12-01T15:00:00.000Z",
    estimatedShipOn: "2027-01-22",
    promisedShipOn: null,
    declineReason: null,
    contact: { name: "Dana Whitlock", email: "dana@example.com", phone: "+13135550123" },
    delivery: { method: "pick-up" },
    lines: [
      {
        id: lineId,
        quantity: 1,
        engraving: "",
        specialRequest: "Stamp my initials.",
        specialRequestAnswer: "",
        build: buildView(),
        totalCents: 248_100,
      },
    ],
    totals: totals(),
    paidCents: 288_866,
    returnedCents: 0,
    history: [],
    next: "The shop answers.",
    openedBy: null,
    proposedShipOn: "2027-01-22",
    ...changes,
  };
}
