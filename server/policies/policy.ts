import { Refusal } from "#server/services/refusal.ts";
import type { Role } from "#shared/contracts/person.ts";
import { type Actor, hasRole } from "./actor.ts";

interface Rule<Subject> {
  /** Names what is done, as "orders.accept"; it stands in the log when it is refused. */
  action: string;
  /** These roles, and those that include them, may do it to every record. */
  roles?: readonly Role[];
  /** Others who may ask; with `owns`, only for a record that is theirs. */
  others?: "anyone" | "signed-in";
  owns?: (actor: Actor, subject: Subject) => boolean;
}

/** A permission as data. Whatever it does not allow is refused. */
export interface Policy<Subject> {
  action: string;
  /** Asked by every route before it reads anything. */
  mayAsk(actor: Actor): boolean;
  may(actor: Actor, subject: Subject): boolean;
  /** @throws Refusal not-signed-in for a visitor, not-allowed for a person */
  require(actor: Actor, subject: Subject): void;
}

export function definePolicy<Subject = null>(rule: Rule<Subject>): Policy<Subject> {
  const isOneOf = (actor: Actor): boolean => hasRole(actor, rule.roles ?? []);
  const isOther = (actor: Actor): boolean =>
    rule.others === "anyone" || (rule.others === "signed-in" && actor.person !== null);
  const may = (actor: Actor, subject: Subject): boolean =>
    isOneOf(actor) || (isOther(actor) && (rule.owns?.(actor, subject) ?? true));
  return {
    action: rule.action,
    mayAsk: (actor) => isOneOf(actor) || isOther(actor),
    may,
    require: (actor, subject) => {
      if (!may(actor, subject)) throw refused(rule.action, actor);
    },
  };
}

/** What a refused actor is told: to sign in, or that the account may not. */
export function refused(action: string, actor: Actor): Refusal {
  return actor.person === null
    ? new Refusal("not-signed-in", "Sign in to go on.", { action })
    : new Refusal("not-allowed", "Your account may not do this.", { action });
}
