import { sequelize } from "#server/database/connection.ts";
import { transaction } from "#server/database/transaction.ts";
import { CatalogueVersion } from "#server/models/catalogue-version.ts";
import { createPerson } from "#server/services/accounts/create-person.ts";
import { findPersonByEmail } from "#server/services/accounts/find-person.ts";
import { openShop } from "#server/services/shop/open-shop.ts";
import type { Role } from "#shared/contracts/person.ts";
import { demoAccounts } from "./accounts.ts";
import { demoCatalogue } from "./catalogue/catalogue.ts";
import { demoPriceList } from "./catalogue/price-list.ts";
import { demoShop } from "./shop.ts";

const names: Record<Role, string> = {
  customer: "Wren Aldous",
  dealer: "Tamsin Rook",
  planner: "Ivo Marsh",
  floor: "Bram Teasel",
  office: "Odile Fenn",
};

const SEED_LOCK = 47_002;

/** Makes the demo shop where it is not there yet: settings, catalogue with prices, one account for each role. */
export async function seedDemo(): Promise<void> {
  const { password, accounts } = demoAccounts;
  await transaction(async () => {
    await sequelize.query("SELECT pg_advisory_xact_lock(:lock)", { replacements: { lock: SEED_LOCK } });
    if ((await CatalogueVersion.count()) === 0) await openShop(demoShop, demoCatalogue, demoPriceList);
    for (const { role, email } of accounts) {
      if (!(await findPersonByEmail(email))) await createPerson({ name: names[role], email, password, role });
    }
  });
}
