import { readFile } from "node:fs/promises";
import { resolve } from "node:path";
import { z } from "zod";
import { sequelize } from "#server/database/connection.ts";
import { transaction } from "#server/database/transaction.ts";
import { CatalogueVersion } from "#server/models/catalogue-version.ts";
import { ShopSettings } from "#server/models/shop-settings.ts";
import { createPerson } from "#server/services/accounts/create-person.ts";
import { findPersonByEmail } from "#server/services/accounts/find-person.ts";
import { publishCatalogue } from "#server/services/catalogue/publish-catalogue.ts";
import { roleSchema, type Role } from "#shared/contracts/person.ts";
import { demoCatalogue } from "./catalogue/catalogue.ts";
import { demoPriceList } from "./catalogue/price-list.ts";
import { demoShop } from "./shop.ts";

/** The same file is read by the start command, which prints the accounts. */
const accountsFile = resolve(import.meta.dirname, "../start/demo-shop.json");
const accountsSchema = z.object({
  password: z.string(),
  accounts: z.array(z.object({ role: roleSchema, email: z.string() })),
});

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
  const { password, accounts } = accountsSchema.parse(JSON.parse(await readFile(accountsFile, "utf8")));
  await transaction(async () => {
    await sequelize.query("SELECT pg_advisory_xact_lock(:lock)", { replacements: { lock: SEED_LOCK } });
    if (!(await ShopSettings.findOne())) await ShopSettings.create(demoShop);
    if ((await CatalogueVersion.count()) === 0) await publishCatalogue(demoCatalogue, demoPriceList);
    for (const { role, email } of accounts) {
      if (!(await findPersonByEmail(email))) await createPerson({ name: names[role], email, password, role });
    }
  });
}
