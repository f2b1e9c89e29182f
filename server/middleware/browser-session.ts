import type { Request, Response } from "express";
import { csrfToken } from "./csrf.ts";
import type { Actor } from "#server/policies/actor.ts";
import type { PersonView } from "#shared/contracts/person.ts";

const MOST_GRANTS = 50;

/** What a route may do with the browser's session. Nothing is stored, and no cookie set, before one of these is called. */
export interface BrowserSession {
  /** What this browser's changing requests must carry from now on. */
  csrfToken(): string;
  keepCart(cartId: string): void;
  /** Lets this browser see one order. */
  grantOrder(orderId: string): void;
  /** Gives the session a new id and signs the person in; a visitor's cart and orders stay. */
  signIn(person: PersonView): Promise<void>;
  /** Ends the session altogether. */
  signOut(): Promise<void>;
}

export function browserSession(request: Request, response: Response): BrowserSession {
  return {
    csrfToken: () => csrfToken(request, response),
    keepCart(cartId) {
      begin(request);
      request.session.cartId = cartId;
    },
    grantOrder(orderId) {
      begin(request);
      const others = (request.session.orderGrants ?? []).filter((id) => id !== orderId);
      request.session.orderGrants = [...others, orderId].slice(-MOST_GRANTS);
    },
    async signIn(person) {
      const { cartId, orderGrants } = request.session;
      await regenerate(request);
      begin(request);
      request.session.personId = person.id;
      request.session.signedInAt = Date.now();
      if (cartId !== undefined) request.session.cartId = cartId;
      if (orderGrants !== undefined) request.session.orderGrants = orderGrants;
    },
    signOut: () => regenerate(request),
  };
}

export function actorOf(request: Request, person: PersonView | null): Actor {
  return {
    person,
    orderGrants: request.session.orderGrants ?? [],
    cartId: request.session.cartId ?? null,
  };
}

function begin(request: Request): void {
  request.session.startedAt ??= Date.now();
  request.session.seenAt = Date.now();
}

/** Ends the stored session and goes on with an empty one under a new id. */
export function regenerate(request: Request): Promise<void> {
  return new Promise((resolve, reject) => {
    request.session.regenerate((error: unknown) => {
      if (error === undefined || error === null) resolve();
      else reject(error instanceof Error ? error : new Error("The session could not be renewed"));
    });
  });
}
