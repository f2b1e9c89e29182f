import { beforeAll, describe, expect, test } from "vitest";
import { createApp } from "#server/app.ts";
import { sequelize } from "#server/database/connection.ts";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import { PriceListVersion } from "#server/models/price-list-version.ts";
import { currentContext } from "#server/services/catalogue/current-context.ts";
import { publishCatalogue } from "#server/services/catalogue/publish-catalogue.ts";
import { today } from "#server/services/shop/today.ts";
import { buildViewSchema } from "#shared/contracts/build.ts";
import { currentCatalogueSchema } from "#shared/contracts/catalogue.ts";
import { priceBuild } from "#shared/pricing/price-build.ts";
import { Browser, problemOf } from "#tests/support/api.ts";
import { makeShop } from "#tests/support/factories.ts";
import { marlSpecCode } from "#tests/support/visitor.ts";
import { marl400 } from "../shared/demo/context.ts";

const app = createApp();
beforeAll(makeShop);

const refusal = /never changed or deleted/;

describe("a published version", () => {
  test.each([
    "UPDATE catalogue_versions SET document = '{}' WHERE version = 1",
    "DELETE FROM catalogue_versions",
    "UPDATE price_list_versions SET effective_on = '2020-01-01'",
    "DELETE FROM price_list_versions",
  ])("is refused by the database to be changed: %s", async (statement) => {
    await expect(sequelize.query(statement)).rejects.toThrow(refusal);
  });

  test("is not published twice", async () => {
    await expect(publishCatalogue(demoCatalogue, demoPriceList)).rejects.toThrow();
  });
});

describe("the current catalogue", () => {
  test("comes with the prices that hold today, not with those of tomorrow", async () => {
    const tomorrow = new Date(Date.parse(await today()) + 24 * 3_600_000).toISOString().slice(0, 10);
    await PriceListVersion.create({
      version: 7,
      effectiveOn: tomorrow,
      document: { ...demoPriceList, version: 7, effectiveOn: tomorrow },
    });
    expect((await currentContext()).priceList.version).toBe(demoPriceList.version);
    const now = await today();
    await PriceListVersion.create({
      version: 8,
      effectiveOn: now,
      document: { ...demoPriceList, version: 8, effectiveOn: now },
    });
    const answer = await new Browser(app).get("/api/catalogue");
    expect(currentCatalogueSchema.parse(answer.body)).toMatchObject({
      catalogue: { version: demoCatalogue.version },
      priceList: { version: 8 },
      today: now,
      load: { minutes: {} },
    });
  });
});

describe("a build", () => {
  test("is priced and judged by the server", async () => {
    const answer = await new Browser(app).post("/api/builds", {
      specCode: marlSpecCode.toLowerCase(),
      numbers: {},
    });
    expect(answer.status).toBe(200);
    const view = buildViewSchema.parse(answer.body);
    const { totalCents } = priceBuild(demoPriceList, demoCatalogue, marl400);
    expect(view).toMatchObject({ family: "Marl", specCode: marlSpecCode, priceCents: totalCents });
    expect(view.summary).toMatch(/^Marl, 4\.\d{3,4} in bore, 9\.\d{3,4} in deck$/);
    expect(view.answers).toHaveLength(demoCatalogue.choices.length);
  });

  test("with a slip in its code, or a number off its grid, is refused at that place", async () => {
    const slipped = `${marlSpecCode.slice(0, -1)}${marlSpecCode.endsWith("0") ? "1" : "0"}`;
    const slip = await new Browser(app).post("/api/builds", { specCode: slipped });
    expect(problemOf(slip)).toMatchObject({ kind: "build-refused", paths: ["specCode"] });
    const number = await new Browser(app).post("/api/builds", {
      specCode: marlSpecCode,
      numbers: { powerAim: "1e9" },
    });
    expect(problemOf(number)).toMatchObject({ kind: "build-refused", paths: ["numbers.powerAim"] });
  });
});
