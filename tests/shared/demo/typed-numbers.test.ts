import { describe, expect, test } from "vitest";
import type { Build } from "#shared/catalogue/build.ts";
import { admitNumber, type Admission } from "#shared/rules/admit-number.ts";
import { checkOrderable } from "#shared/rules/check-orderable.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { demoContext, marl400 } from "./context.ts";

const { catalogue } = demoContext;

const marl = (answers: Build["answers"], numbers: Build["numbers"] = {}): Build => ({
  answers: { ...marl400.answers, ...answers },
  numbers,
  mine: [],
});
const admit = (build: Build, id: string, value: string): Admission =>
  admitNumber(demoContext, build, id, value);
const rulesAgainst = (admission: Admission): string[] => (admission.ok ? [] : admission.reason.rules);
const figure = (build: Build, id: string) =>
  evaluate(demoContext, build).figures.find((candidate) => candidate.id === id)?.value;
const findings = (build: Build) =>
  new Map(evaluate(demoContext, build).findings.map((finding) => [finding.rule, finding]));
const stops = (build: Build): string[] =>
  evaluate(demoContext, build).findings.flatMap(({ rule, severity }) => (severity === "stop" ? [rule] : []));

describe("own numbers", { timeout: 60_000 }, () => {
  const own = marl({ rotatingAssembly: "ownSteel" });
  const numbers = {
    stroke: "3.75",
    rodLength: "6",
    compressionHeight: "1.125",
    skirtLength: "0.95",
    bossDrop: "0.55",
    counterweightRadius: "3.25",
    lobeRadius: "0.9",
  };

  test("the preset's sizes typed by hand give the preset's figures", () => {
    const typed = { ...own, numbers };
    expect(checkOrderable(demoContext, typed).ok).toBe(true);
    const preset = evaluate(demoContext, marl400).figures;
    const same = evaluate(demoContext, typed).figures;
    expect(same.map(({ id, value }) => [id, value])).toEqual(preset.map(({ id, value }) => [id, value]));
  });

  test.each([
    ["stroke", "3.875", "rod-to-case-steel"],
    ["rodLength", "6.05", "piston-proud"],
    ["compressionHeight", "1.05", "piston-short"],
    ["skirtLength", "1.3501", "skirt-exposure-most"],
    ["bossDrop", "0.8151", "counterweight-to-boss"],
    ["counterweightRadius", "3.68", "counterweight-to-case"],
    ["lobeRadius", "0.9241", "lobe-to-journal"],
  ])("%s of %s is held to %s", (id, value, rule) => {
    const typed = { ...own, numbers: { ...numbers, [id]: value } };
    expect(stops(typed)).toContain(rule);
  });

  test("a limit met exactly passes", () => {
    expect(stops({ ...own, numbers: { ...numbers, skirtLength: "1.35" } })).toEqual([]);
    expect(figure({ ...own, numbers: { ...numbers, skirtLength: "1.35" } }, "skirtExposure")).toBe(0.6);
    expect(stops({ ...own, numbers: { ...numbers, bossDrop: "0.815" } })).toEqual([]);
    expect(stops({ ...own, numbers: { ...numbers, lobeRadius: "0.924" } })).toEqual([]);
  });

  test("with the rods not chosen yet, what their outline decides is to be confirmed and closes nothing", () => {
    const build = marl({ rotatingAssembly: "ownRodsNotKnown" }, { ...numbers, stroke: "3.875" });
    expect(figure(build, "rodToCase")).toBeNull();
    expect(figure(build, "rodRatio")).toBeCloseTo(6 / 3.875, 6);
    expect(stops({ ...build, numbers: { ...build.numbers, compressionHeight: "1.0625" } })).toEqual([]);
  });

  test("left for a preset, the numbers stay and are not read", () => {
    const typed = { ...own, numbers: { ...numbers, stroke: "3.875" } };
    const left = { ...typed, answers: marl400.answers };
    expect(checkOrderable(demoContext, left).ok).toBe(true);
    expect(figure(left, "displacement")).toBe(figure(marl400, "displacement"));
  });
});

describe("heads and gasket", () => {
  test("steel rods ask for 0.035 in to the head, aluminium for 0.055 in, and a gasket that clears the bore by 0.010 in", () => {
    // Deck clearance 0.025 in.
    expect(admit(marl({}), "gasketThickness", "0.01")).toEqual({ ok: true });
    expect(rulesAgainst(admit(marl({}), "gasketThickness", "0.0099"))).toEqual(["piston-to-head-steel"]);
    const aluminium = marl({ rotatingAssembly: "ownAluminium", strokeClearance: "relieved" });
    const deck = { stroke: "3.48", rodLength: "5.7", compressionHeight: "1.56" };
    expect(rulesAgainst(admit({ ...aluminium, numbers: deck }, "gasketThickness", "0.0299"))).toEqual([
      "piston-to-head-aluminium",
    ]);
    expect(admit({ ...aluminium, numbers: deck }, "gasketThickness", "0.03")).toEqual({ ok: true });
    expect(admit(marl({}), "gasketBore", "4.135")).toEqual({ ok: true });
    expect(rulesAgainst(admit(marl({}), "gasketBore", "4.1349"))).toEqual(["gasket-bore"]);
  });

  test("compression is a caution by duty and induction, and unknown it is to be confirmed", () => {
    const heads = { chamber: "58", gasketBore: "4.165", gasketThickness: "0.041", dish: "5" };
    expect(findings(marl({})).get("compression-pump-fuel")).toMatchObject({ undecided: true });
    expect(findings(marl({}, heads)).get("compression-pump-fuel")).toMatchObject({ severity: "caution" });
    expect(findings(marl({ duty: "drag" }, heads)).has("compression-pump-fuel")).toBe(false);
  });
});

describe("honed to my pistons", () => {
  const honed = marl({ boreFinish: "honedToMyPistons" });
  const skirt = (id: number, size: string): Build["numbers"] => ({ [`skirt${id}`]: size });

  test("asks for eight skirts and the clearance, and says so until they are there", () => {
    expect(findings(honed).get("honed-cylinders-near-bore")).toMatchObject({ undecided: true });
    const numbers = [1, 2, 3, 4, 5, 6, 7, 8].reduce((all, id) => ({ ...all, ...skirt(id, "4.1205") }), {
      pistonClearance: "0.0045",
    });
    const whole = { ...honed, numbers };
    expect(findings(whole).has("honed-cylinders-near-bore")).toBe(false);
    expect(figure(whole, "deliveredBore")).toBe(4.125);
    expect(checkOrderable(demoContext, whole).ok).toBe(true);
  });

  test("each cylinder lies within 0.0025 in of the chosen bore, the limit itself included", () => {
    const asked = { ...honed, numbers: { pistonClearance: "0.0045" } };
    expect(admit(asked, "skirt8", "4.1230")).toEqual({ ok: true });
    expect(admit(asked, "skirt8", "4.1180")).toEqual({ ok: true });
    expect(rulesAgainst(admit(asked, "skirt8", "4.1231"))).toEqual(["honed-cylinders-near-bore"]);
    expect(rulesAgainst(admit(asked, "skirt8", "4.1179"))).toEqual(["honed-cylinders-near-bore"]);
  });

  test("the largest cylinder counts for the wall", () => {
    const numbers = [1, 2, 3, 4, 5, 6, 7].reduce((all, id) => ({ ...all, ...skirt(id, "4.1505") }), {
      pistonClearance: "0.0045",
    });
    const edge = { ...honed, answers: { ...honed.answers, bore: "b4155" }, numbers };
    expect(admit(edge, "skirt8", "4.1505")).toEqual({ ok: true });
    expect(rulesAgainst(admit(edge, "skirt8", "4.1506"))).toEqual(["wall-naturally-aspirated"]);
  });

  test("the finish hone to nominal size needs no piston", () => {
    const nominal = marl({ boreFinish: "finishHoned" }, skirt(1, "3.95"));
    expect(checkOrderable(demoContext, nominal).ok).toBe(true);
    expect(figure(nominal, "deliveredBore")).toBe(4.125);
  });
});

describe("nitrous", () => {
  const nitrous = marl({ induction: "nitrous", bore: "b4030" });

  test("a shot above 150 hp needs splayed caps, and is read only with nitrous", () => {
    expect(admit(nitrous, "nitrousShot", "150")).toEqual({ ok: true });
    // Without the mark, the cheapest mend is to leave the nitrous out.
    const refused = admit({ ...nitrous, mine: ["induction"] }, "nitrousShot", "151");
    expect(rulesAgainst(refused)).toEqual(["shot-by-caps"]);
    expect(refused.ok ? null : refused.mend?.changes).toEqual([
      { choice: "capStyle", from: "fourBoltStraight", to: "fourBoltSplayedDuctile" },
    ]);
    expect(admit(marl({}), "nitrousShot", "400")).toEqual({ ok: true });
  });

  test("the shot is added to what the engine usually makes without it", () => {
    const aspirated = marl({ bore: "b4030" }, { rpmAim: "6000" });
    const shot = { ...nitrous, numbers: { rpmAim: "6000", nitrousShot: "100" } };
    expect(figure(shot, "powerHigh")).toBeCloseTo((figure(aspirated, "powerHigh") ?? Number.NaN) + 100, 6);
    expect(figure({ ...nitrous, numbers: { rpmAim: "6000" } }, "powerHigh")).toBeNull();
  });
});

describe("choices beside the main job", () => {
  test.each([
    ["dry-sump-dipstick", { oiling: "drySump", fuelPumpPad: "plainPad" }],
    ["fitted-bearings-need-hone", { camBearings: "fitted" }],
    ["front-plate-pump-pad", { mounts: "frontPlate" }],
    ["full-report-walls", { fullReport: "fullReport", sonicReport: "noSonic" }],
    ["marine-core-plugs", { duty: "marine" }],
    [
      "flat-tappet-tunnel",
      { lifterStyle: "flatTappet", camTunnel: "rolling50", rotatingAssembly: "s3480r5700steel" },
    ],
  ])("%s", (rule, answers) => {
    expect(stops(marl(answers))).toEqual([rule]);
  });

  test("every one is priced, and the first answer of each costs and delays nothing", () => {
    const asked = [
      "dipstickSide",
      "camBearings",
      "mounts",
      "coating",
      "fullReport",
      "plugKit",
      "headStudKit",
      "mainStudKit",
    ];
    const { choices } = evaluate(demoContext, marl400);
    for (const id of asked) {
      const [first] = choices.find(({ choice }) => choice === id)?.options ?? [];
      expect(first?.effect, id).toEqual({ priceCents: 0, weight: 0, days: 0 });
    }
    expect(catalogue.choices.length).toBeGreaterThanOrEqual(34);
  });
});
