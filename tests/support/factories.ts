import { randomUUID } from "node:crypto";
import argon2 from "argon2";
import type { Express } from "express";
import { Person } from "#server/models/person.ts";
import { ShopSettings } from "#server/models/shop-settings.ts";
import { CatalogueVersion } from "#server/models/catalogue-version.ts";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import { publishCatalogue } from "#server/services/catalogue/publish-catalogue.ts";
import type { Role } from "#shared/contracts/person.ts";
import { Browser } from "./api.ts";

export const factoryPassword = "plough-and-harrow-at-dawn";

/** Weaker than the product makes them, so that tests do not wait for it; it is read the same way. */
let cheapHash: Promise<string> | undefined;
function hashCheaply(): Promise<string> {
  cheapHash ??= argon2.hash(factoryPassword, { memoryCost: 1024, timeCost: 2, parallelism: 1 });
  return cheapHash;
}

/** A person with a confirmed address and the password `factoryPassword`. */
export async function makePerson(
  values: Partial<Pick<Person, "name" | "email" | "role" | "emailVerifiedAt" | "disabledAt">> = {},
): Promise<Person> {
  const id = randomUUID();
  return Person.create({
    id,
    name: "Rowan Hale",
    email: `person-${id}@shop.example`,
    role: "customer",
    emailVerifiedAt: new Date(),
    passwordHash: await hashCheaply(),
    ...values,
  });
}

/** A browser in which somebody of this role is signed in. */
export async function makeSignedIn(app: Express, role: Role): Promise<{ browser: Browser; person: Person }> {
  const person = await makePerson({ role });
  const browser = new Browser(app);
  const answer = await browser.signIn(person.email, factoryPassword);
  if (answer.status !== 200) throw new Error(`Signing in answered ${answer.status}: ${answer.text}`);
  return { browser, person };
}

/** Settings, catalogue and prices, as every page needs them. Safe to repeat within a file. */
export async function makeShop(): Promise<void> {
  if (!(await ShopSettings.findOne())) {
    await ShopSettings.create({
      name: "Test Foundry",
      email: "shop@shop.example",
      phone: "+16155550100",
      address: {
        line1: "1 Pattern Yard",
        line2: "",
        city: "Mouldsworth",
        state: "TN",
        postalCode: "37011",
        country: "US",
      },
      timeZone: "America/Chicago",
    });
  }
  if ((await CatalogueVersion.count()) === 0) await publishCatalogue(demoCatalogue, demoPriceList);
}
