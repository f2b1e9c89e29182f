import { readFile } from "node:fs/promises";
import { z } from "zod";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import { demoShop } from "#server/demo/shop.ts";
import { startSentence } from "#server/start-sentence.ts";
import { catalogueSchema } from "#shared/catalogue/catalogue.ts";
import { addressSchema, phoneSchema } from "#shared/contracts/address.ts";
import { emailAddressSchema } from "#shared/contracts/person.ts";
import { priceListSchema } from "#shared/pricing/price-list.ts";

/**
 * A shop's own settings, catalogue and prices from the command line, until the Office edits them:
 * `npm run --silent shop -- example > shop.json` writes the demo's document as a start, `npm run shop -- open shop.json`
 * writes the settings and publishes catalogue and price list. A published version never changes; a later document needs
 * new version numbers.
 */
const documentSchema = z.object({
  shop: z.object({
    name: z.string().trim().min(1).max(100),
    email: emailAddressSchema,
    phone: phoneSchema,
    address: addressSchema,
    timeZone: z
      .string()
      .refine((name) => Intl.supportedValuesOf("timeZone").includes(name), "is not a time zone"),
  }),
  catalogue: catalogueSchema,
  priceList: priceListSchema,
});

const usage = `Say: npm run --silent shop -- example > shop.json
 or: npm run shop -- open shop.json`;

function example(): string {
  return JSON.stringify({ shop: demoShop, catalogue: demoCatalogue, priceList: demoPriceList }, null, 2);
}

async function open(file: string | undefined): Promise<string> {
  if (file === undefined) throw new Error(usage);
  const parsed = documentSchema.safeParse(JSON.parse(await readFile(file, "utf8")));
  if (!parsed.success) throw new Error(`${file} does not fit:\n${z.prettifyError(parsed.error)}`);
  const { shop, catalogue, priceList } = parsed.data;
  // Loaded here: only now is the environment needed.
  const { openShop } = await import("#server/services/shop/open-shop.ts");
  const { sequelize } = await import("#server/database/connection.ts");
  await openShop(shop, catalogue, priceList);
  await sequelize.close();
  return `${shop.name} is open with catalogue ${catalogue.version} and price list ${priceList.version}, in effect from ${priceList.effectiveOn}.`;
}

function sentenceFor(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  if (error.name === "SequelizeUniqueConstraintError")
    return "This version of the catalogue or of the price list is published already, and a published one never changes. Give the document the next version number.";
  return error.name === "Error" || error instanceof SyntaxError ? error.message : startSentence(error);
}

try {
  const [verb, file] = process.argv.slice(2);
  if (verb !== "example" && verb !== "open") throw new Error(usage);
  process.stdout.write(`${verb === "example" ? example() : await open(file)}\n`);
} catch (error) {
  process.stderr.write(`${sentenceFor(error)}\n`);
  process.exit(1);
}
