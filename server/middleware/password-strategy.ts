import type { Request, RequestHandler, Response } from "express";
import passport from "passport";
import { Strategy } from "passport-local";
import { presentPerson } from "#server/presenters/person.ts";
import { checkSignIn } from "#server/services/accounts/check-sign-in.ts";
import type { PersonView } from "#shared/contracts/person.ts";

// Under a name: passport then makes a copy for each request. A strategy handed over as an object is shared by all that
// run at the same time, and answers one of them with the person of another.
const strategyName = "password";
const strategy = new Strategy(
  { usernameField: "email", passwordField: "password", session: false, passReqToCallback: true },
  (request, email, password, done) => {
    checkSignIn(email, password, request.ip ?? "").then(
      (person) => {
        done(null, person === null ? false : presentPerson(person));
      },
      (error: unknown) => {
        done(error);
      },
    );
  },
);

passport.use(strategyName, strategy);

/**
 * Asks passport for the person whose address and password the request's body holds; null when they fit nobody.
 * @throws Refusal too-many-requests
 */
export function authenticate(request: Request, response: Response): Promise<PersonView | null> {
  return new Promise((resolve, reject) => {
    const answer = (error: unknown, person: PersonView | false | null | undefined): void => {
      if (error instanceof Error) reject(error);
      else resolve(person || null);
    };
    const check = passport.authenticate(strategyName, { session: false }, answer) as RequestHandler;
    Promise.resolve(check(request, response, reject)).catch(reject);
  });
}
