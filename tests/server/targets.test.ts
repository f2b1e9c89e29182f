import { beforeAll, describe, expect, test } from "vitest";
import { createApp } from "#server/app.ts";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { encodeSpec } from "#shared/catalogue/spec-code.ts";
import { buildViewSchema, mendResultSchema } from "#shared/contracts/build.ts";
import { targetResultSchema } from "#shared/contracts/target.ts";
import { Browser, problemOf } from "#tests/support/api.ts";
import { makeShop } from "#tests/support/factories.ts";
import { marl400 } from "#tests/shared/demo/context.ts";

const app = createApp();
beforeAll(makeShop);

const street = { duty: "street", induction: "naturallyAspirated" };

describe("POST /api/targets", () => {
  test("answers with builds that can be ordered at the price and date that it says", async () => {
    const browser = new Browser(app);
    const answer = await browser.post("/api/targets", { ...street, displacement: { least: 395, most: 410 } });
    expect(answer.status).toBe(200);
    const { builds, inTheWay } = targetResultSchema.parse(answer.body);
    expect(inTheWay).toEqual([]);
    expect(builds.length).toBeGreaterThan(3);
    for (const { specCode, numbers, priceCents, shipsOn, weight, summary } of builds.slice(0, 3)) {
      const checked = await browser.post("/api/builds", { specCode, numbers });
      expect(checked.status).toBe(200);
      expect(buildViewSchema.parse(checked.body)).toMatchObject({ priceCents, shipsOn, weight, summary });
    }
  });

  test("says which wish stands in the way of any", async () => {
    const answer = await new Browser(app).post("/api/targets", { ...street, budgetCents: 5000 });
    const { builds, inTheWay } = targetResultSchema.parse(answer.body);
    expect(builds).toEqual([]);
    expect(inTheWay.map(({ wish }) => wish)).toEqual(["budgetCents"]);
  });

  test("names each field that the catalogue cannot read", async () => {
    const answer = await new Browser(app).post("/api/targets", {
      duty: "hovering",
      induction: "boosted",
      rpm: 99_000,
      have: { answers: { paint: "red", mainSize: "m9999" }, numbers: { stroke: "99" } },
    });
    expect(answer.status).toBe(422);
    expect(problemOf(answer).paths.sort()).toEqual([
      "duty",
      "have.answers.mainSize",
      "have.answers.paint",
      "have.numbers.stroke",
      "rpm",
    ]);
  });

  test("takes no displacement upside down and no date that is none", async () => {
    const upsideDown = { ...street, displacement: { least: 410, most: 400 } };
    for (const target of [upsideDown, { ...street, shipBy: "2026-13-01" }, { ...street, budgetCents: 0.5 }])
      expect((await new Browser(app).post("/api/targets", target)).status).toBe(422);
  });
});

describe("POST /api/builds/mend", () => {
  const specCode = encodeSpec(demoCatalogue, marl400.answers);
  const wanted = { choice: "rotatingAssembly", option: "s3875r6000steel" };

  test("says why an option is closed and what lets it in", async () => {
    const answer = await new Browser(app).post("/api/builds/mend", { specCode, wanted });
    expect(answer.status).toBe(200);
    const { reason, mend } = mendResultSchema.parse(answer.body);
    expect(reason?.rules.length).toBeGreaterThan(0);
    expect(mend?.changes).toEqual([{ choice: "strokeClearance", from: "asCast", to: "relieved" }]);
    expect(mend?.priceCents).toBe(14_500);
  });

  test("keeps what is mine: a reason and no mend", async () => {
    const mine = ["strokeClearance"];
    const answer = await new Browser(app).post("/api/builds/mend", { specCode, wanted, mine });
    const { reason, mend } = mendResultSchema.parse(answer.body);
    expect(reason).not.toBeNull();
    expect(mend).toBeNull();
  });

  test("has nothing to say of an open option or of a build that stands", async () => {
    const open = { choice: "coating", option: "painted" };
    for (const body of [{ specCode, wanted: open }, { specCode }]) {
      const answer = await new Browser(app).post("/api/builds/mend", body);
      expect(answer.body).toEqual({ reason: null, mend: null });
    }
  });

  test("repairs a whole build that no longer stands", async () => {
    const answer = await new Browser(app).post("/api/builds/mend", {
      specCode: encodeSpec(demoCatalogue, { ...marl400.answers, deckGroove: "wire", deckFinish: "fine" }),
    });
    const { reason, mend } = mendResultSchema.parse(answer.body);
    expect(reason?.rules).toHaveLength(1);
    expect(mend?.changes).toHaveLength(1);
  });

  test("names what it cannot read", async () => {
    const refused = async (body: object): Promise<string[]> => {
      const answer = await new Browser(app).post("/api/builds/mend", body);
      expect(answer.status).toBe(422);
      return problemOf(answer).paths;
    };
    expect(await refused({ specCode: "no code at all" })).toEqual(["specCode"]);
    expect(await refused({ specCode, numbers: { powerAim: "many" } })).toEqual(["numbers.powerAim"]);
    expect(await refused({ specCode, wanted: { choice: "paint", option: "red" } })).toEqual([
      "wanted.choice",
    ]);
    expect(await refused({ specCode, wanted: { choice: "bore", option: "b1" } })).toEqual(["wanted.option"]);
  });
});
