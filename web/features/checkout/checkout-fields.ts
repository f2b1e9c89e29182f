import { z } from "zod";
import { contactSchema, deliverySchema } from "#shared/contracts/address.ts";
import type { SessionView } from "#shared/contracts/session.ts";
import { forget, keep, readKept } from "#web/lib/kept.ts";

/** What the checkout asks: who, and where to. The server's own schemas. */
export const checkoutSchema = z.object({ contact: contactSchema, delivery: deliverySchema });
export type CheckoutFields = z.input<typeof checkoutSchema>;
export type CheckoutAnswers = z.output<typeof checkoutSchema>;

export const checkoutPaths = [
  "contact.name",
  "contact.email",
  "contact.phone",
  "delivery.method",
  "delivery.address.line1",
  "delivery.address.line2",
  "delivery.address.city",
  "delivery.address.state",
  "delivery.address.postalCode",
] as const;

/** The form as text, before it is checked; also what is kept for the tab. */
const typedSchema = z.object({
  contact: z.object({ name: z.string(), email: z.string(), phone: z.string() }),
  delivery: z.object({
    method: z.enum(["freight", "pick-up"]),
    address: z.object({
      line1: z.string(),
      line2: z.string(),
      city: z.string(),
      state: z.string(),
      postalCode: z.string(),
    }),
  }),
});

const keptUnder = "checkout";

/** What was typed before in this tab, else what the shop knows of the person. */
export function startingFields(person: SessionView["person"]): CheckoutFields {
  const kept = readKept(keptUnder, typedSchema);
  return {
    contact: {
      name: kept?.contact.name || (person?.name ?? ""),
      email: kept?.contact.email || (person?.email ?? ""),
      phone: kept?.contact.phone ?? "",
    },
    delivery: kept?.delivery ?? {
      method: "freight",
      address: { line1: "", line2: "", city: "", state: "", postalCode: "" },
    },
  };
}

export function keepFields(fields: unknown): void {
  keep(keptUnder, fields);
}

/** After the payment: on a shared computer nobody else's address is to be found. */
export function forgetFields(): void {
  forget(keptUnder);
}
