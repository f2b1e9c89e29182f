import type { z } from "zod";
import { accountExists } from "./account-exists.ts";
import { orderAccepted } from "./order-accepted.ts";
import { orderDeclined } from "./order-declined.ts";
import { orderLink } from "./order-link.ts";
import { orderPlaced } from "./order-placed.ts";
import { passwordChanged } from "./password-changed.ts";
import { paymentReturned } from "./payment-returned.ts";
import { resetPassword } from "./reset-password.ts";
import { verifyAddress } from "./verify-address.ts";

/** Every kind of message that the product sends. */
export const emailKinds = {
  [verifyAddress.kind]: verifyAddress,
  [resetPassword.kind]: resetPassword,
  [passwordChanged.kind]: passwordChanged,
  [accountExists.kind]: accountExists,
  [orderPlaced.kind]: orderPlaced,
  [orderAccepted.kind]: orderAccepted,
  [orderDeclined.kind]: orderDeclined,
  [paymentReturned.kind]: paymentReturned,
  [orderLink.kind]: orderLink,
};

export type EmailKindName = keyof typeof emailKinds;
export type EmailData<Kind extends EmailKindName> = z.input<(typeof emailKinds)[Kind]["data"]>;

/** @throws Error for a kind that this version of the product does not know */
export function emailKind(name: string): (typeof emailKinds)[EmailKindName] {
  const found = Object.values(emailKinds).find((kind) => kind.kind === name);
  if (!found) throw new Error(`There is no kind of message called "${name}"`);
  return found;
}
