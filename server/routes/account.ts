import type { Request } from "express";
import { authenticate } from "#server/middleware/password-strategy.ts";
import type { Actor } from "#server/policies/actor.ts";
import { anyone, ownAccount } from "#server/policies/common.ts";
import { presentPerson } from "#server/presenters/person.ts";
import { askForReset } from "#server/services/accounts/ask-for-reset.ts";
import { changePassword } from "#server/services/accounts/change-password.ts";
import { register } from "#server/services/accounts/register.ts";
import { resendVerification } from "#server/services/accounts/resend-verification.ts";
import { resetPassword } from "#server/services/accounts/reset-password.ts";
import { verifyEmail } from "#server/services/accounts/verify-email.ts";
import { adoptCart } from "#server/services/cart/adopt-cart.ts";
import { countTry } from "#server/services/rate-limits.ts";
import { Refusal } from "#server/services/refusal.ts";
import {
  acknowledgementSchema,
  changePasswordRequestSchema,
  forgotRequestSchema,
  registerRequestSchema,
  resetRequestSchema,
  signInRequestSchema,
  verifyRequestSchema,
} from "#shared/contracts/account.ts";
import type { PersonView } from "#shared/contracts/person.ts";
import { sessionSchema } from "#shared/contracts/session.ts";
import { defineRoute } from "./define-route.ts";
import { presentSession } from "./session.ts";

const addressOf = (request: Request): string => request.ip ?? "";

function signedIn(actor: Actor): PersonView {
  if (actor.person === null) throw new Refusal("not-signed-in", "Sign in to go on.");
  return actor.person;
}

/** Whoever has just signed in or out. */
const actorIs = (person: PersonView | null): Actor => ({ person, cartId: null, orderGrants: [] });

export const accountRoutes = [
  defineRoute({
    method: "post",
    path: "/api/account/register",
    summary: "Make an account; a link to confirm the address is mailed",
    access: anyone,
    body: registerRequestSchema,
    response: acknowledgementSchema,
    status: 202,
    problems: ["validation", "too-many-requests"],
    handle: async ({ body, request }) => {
      await countTry("register by address", addressOf(request));
      await register(body);
      return { message: "We have sent you a message. Open its link to confirm your address, then sign in." };
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/account/verify",
    summary: "Confirm an address with the token of a mailed link",
    access: anyone,
    body: verifyRequestSchema,
    response: acknowledgementSchema,
    problems: ["validation", "too-many-requests"],
    handle: async ({ body, request }) => {
      await countTry("token by address", addressOf(request));
      await verifyEmail(body.token);
      return { message: "Your address is confirmed." };
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/account/resend-verification",
    summary: "Mail the link once more that confirms one's own address",
    access: ownAccount,
    response: acknowledgementSchema,
    status: 202,
    problems: ["too-many-requests"],
    handle: async ({ actor }) => {
      const { id, email } = signedIn(actor);
      await countTry("confirmation by account", id);
      await resendVerification(id);
      return { message: `A new link is on its way to ${email}.` };
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/account/sign-in",
    summary: "Sign in with address and password; a visitor's cart comes along",
    access: anyone,
    body: signInRequestSchema,
    response: sessionSchema,
    problems: ["validation", "too-many-requests"],
    handle: async ({ request, response, actor, session }) => {
      const person = await authenticate(request, response);
      if (person === null) {
        const message = "Address and password do not fit together.";
        throw new Refusal("validation", message, { errors: [{ path: "password", message }] });
      }
      if (actor.cartId !== null) await adoptCart(person.id, actor.cartId);
      await session.signIn(person);
      return presentSession(actorIs(person), session);
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/account/sign-out",
    summary: "End this browser's session",
    access: anyone,
    response: sessionSchema,
    handle: async ({ session }) => {
      await session.signOut();
      return presentSession(actorIs(null), session);
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/account/forgot",
    summary: "Mail a link to set a new password, if the address has an account",
    access: anyone,
    body: forgotRequestSchema,
    response: acknowledgementSchema,
    status: 202,
    problems: ["validation", "too-many-requests"],
    handle: async ({ body, request }) => {
      await countTry("forgotten password by address", addressOf(request));
      await countTry("forgotten password by account", body.email);
      await askForReset(body.email);
      return { message: "If this address has an account, a link to set a new password is on its way to it." };
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/account/reset",
    summary: "Set a new password with the token of a mailed link; every session ends",
    access: anyone,
    body: resetRequestSchema,
    response: acknowledgementSchema,
    problems: ["validation", "too-many-requests"],
    handle: async ({ body, request }) => {
      await countTry("token by address", addressOf(request));
      await resetPassword(body);
      return { message: "Your new password is set. Sign in with it." };
    },
  }),
  defineRoute({
    method: "post",
    path: "/api/account/change-password",
    summary: "Change one's own password; every other session ends",
    access: ownAccount,
    body: changePasswordRequestSchema,
    response: sessionSchema,
    problems: ["validation", "too-many-requests"],
    handle: async ({ actor, body, session }) => {
      const person = presentPerson(await changePassword(signedIn(actor).id, body));
      await session.signIn(person);
      return presentSession(actorIs(person), session);
    },
  }),
];
