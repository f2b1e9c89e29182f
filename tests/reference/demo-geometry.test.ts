import { describe, expect, test } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import * as dimensions from "#shared/geometry/dimensions.ts";
import { displacement } from "#shared/geometry/displacement.ts";
import { rodToBarrel, rodToCam } from "#shared/geometry/rod-clearance.ts";
import { measureOutline, rodToCase } from "#shared/geometry/rod-outline.ts";
import { blockWeight } from "#shared/geometry/weight.ts";

/**
 * The demo's own table: rows of invented blocks whose figures two independent sweeps gave. Case swing radii as cast, relieved and
 * deep relief; what a cell leaves out is not made.
 */
const marl = {
  spacing: 4.4,
  barrel: 4.615,
  shift: 0.03,
  bottom: 3.375,
  boss: 0.55,
  skirt: 0.95,
  swings: [3.73, 3.86],
};
const basalt = { ...marl, barrel: 4.72, shift: 0.02, swings: [3.73, 3.86, 3.99] };
const gneiss = {
  spacing: 4.84,
  barrel: 5.14,
  shift: 0.02,
  bottom: 3.65,
  boss: 0.6,
  skirt: 1.05,
  swings: [4.075, 4.205, 4.34],
};

/** Notch of the stroke clearance: as cast, relieved, deep relief. */
const notches = [0, 0.11, 0.19];

interface Row {
  name: string;
  family: typeof marl;
  build: [bore: number, stroke: number, rod: number, height: number, deck: number, counterweight: number];
  outline: string;
  cubicInches: number;
  wall: number;
  web: number;
  case: number[];
  /** Lobe radius, cam height, and the distance. */
  cam: [lobeRadius: number, camHeight: number, distance: number];
  rodToBarrel: number[];
  skirt: number;
  boss: number;
}

const rows: Row[] = [
  {
    name: "Marl 3.480",
    family: marl,
    build: [4, 3.48, 5.7, 1.56, 9.025, 3.1],
    outline: "steel",
    cubicInches: 349.8,
    wall: 0.2775,
    web: 0.4,
    case: [0.2, 0.33],
    cam: [0.9, 4.52, 0.5025],
    rodToBarrel: [0.226, 0.336],
    skirt: 0.365,
    boss: 0.31,
  },
  {
    name: "Marl 3.750",
    family: marl,
    build: [4.125, 3.75, 6, 1.125, 9.025, 3.25],
    outline: "steel",
    cubicInches: 400.9,
    wall: 0.215,
    web: 0.275,
    case: [0.065, 0.195],
    cam: [0.9, 4.52, 0.3658],
    rodToBarrel: [0.112, 0.222],
    skirt: 0.2,
    boss: 0.325,
  },
  {
    name: "Marl 4.155 shouldered",
    family: marl,
    build: [4.155, 3.75, 6, 1.125, 9.025, 3.25],
    outline: "shouldered",
    cubicInches: 406.8,
    wall: 0.2,
    web: 0.245,
    case: [0.065, 0.195],
    cam: [0.9, 4.52, 0.1572],
    rodToBarrel: [0.118, 0.228],
    skirt: 0.2,
    boss: 0.325,
  },
  {
    name: "Marl 3.875",
    family: marl,
    build: [4.125, 3.875, 6, 1.0625, 9.025, 3.25],
    outline: "steel",
    cubicInches: 414.3,
    wall: 0.215,
    web: 0.275,
    case: [0.002, 0.132],
    cam: [0.9, 4.52, 0.3007],
    rodToBarrel: [0.044, 0.154],
    skirt: 0.263,
    boss: 0.263,
  },
  {
    name: "Marl aluminium",
    family: marl,
    build: [4.125, 3.75, 6, 1.125, 9.025, 3.25],
    outline: "aluminium",
    cubicInches: 400.9,
    wall: 0.215,
    web: 0.275,
    case: [-0.102, 0.028],
    cam: [0.9, 4.52, 0.2498],
    rodToBarrel: [-0.037, 0.073],
    skirt: 0.2,
    boss: 0.325,
  },
  {
    name: "Basalt aluminium",
    family: basalt,
    build: [4.185, 3.875, 6.125, 1.25, 9.325, 3.3],
    outline: "aluminium",
    cubicInches: 426.4,
    wall: 0.2475,
    web: 0.215,
    case: [-0.165, -0.035, 0.095],
    cam: [1.05, 4.92, 0.4347],
    rodToBarrel: [-0.091, 0.019, 0.099],
    skirt: 0.138,
    boss: 0.338,
  },
  {
    name: "Gneiss 4.250",
    family: gneiss,
    build: [4.5, 4.25, 6.385, 1.27, 9.8, 3.45],
    outline: "steelLarge",
    cubicInches: 540.7,
    wall: 0.3,
    web: 0.34,
    case: [0.07, 0.2, 0.335],
    cam: [0.95, 5.15, 0.6198],
    rodToBarrel: [0.101, 0.211, 0.291],
    skirt: 0.44,
    boss: 0.21,
  },
];

function outlineOf(id: string): readonly (readonly [number, number])[] {
  const outline = demoCatalogue.outlines.find((candidate) => candidate.id === id);
  if (outline === undefined) throw new Error(`no outline ${id}`);
  return outline.points;
}

describe("figures of the demo's table", () => {
  test.each(rows)("$name", (row) => {
    const [bore, stroke, rodLength, compressionHeight, deckHeight, counterweightRadius] = row.build;
    const { family } = row;
    expect(displacement({ bore, stroke, cylinders: 8 }).cubicInches).toBeCloseTo(row.cubicInches, 1);
    const wall = dimensions.cylinderWall({
      barrelOutsideDiameter: family.barrel,
      finishBore: bore,
      coreShift: family.shift,
    });
    expect(wall).toBe(row.wall);
    expect(dimensions.webBetweenBores({ boreSpacing: family.spacing, finishBore: bore })).toBe(row.web);
    // The table gives three places.
    family.swings.forEach((caseSwingRadius, at) => {
      const clearance = rodToCase({ caseSwingRadius, stroke, outline: outlineOf(row.outline) });
      expect(Math.abs(clearance - (row.case[at] ?? Number.NaN))).toBeLessThanOrEqual(0.00051);
    });
    const rods = { stroke, rodLength, bankAngle: Math.PI / 4, outline: outlineOf(row.outline) };
    const [lobeRadius, camHeight, distance] = row.cam;
    expect(rodToCam({ ...rods, lobeRadius, camHeight }).value).toBe(distance);
    row.rodToBarrel.forEach((expected, at) => {
      const { value, rod } = rodToBarrel({
        ...rods,
        bore,
        barrelBottom: family.bottom,
        bankOffset: 0.92,
        bigEndWidth: 0.94,
        notch: notches[at] ?? Number.NaN,
      });
      expect(Math.abs(value - expected)).toBeLessThanOrEqual(0.00051);
      expect(rod).toBe("other");
    });
    const exposure = dimensions.skirtExposure({
      barrelBottom: family.bottom,
      rodLength,
      stroke,
      skirtLength: family.skirt,
    });
    expect(Math.abs(exposure - row.skirt)).toBeLessThanOrEqual(0.00051);
    const boss = dimensions.counterweightToBoss({
      rodLength,
      stroke,
      bossDrop: family.boss,
      counterweightRadius,
    });
    expect(Math.abs(boss - row.boss)).toBeLessThanOrEqual(0.00051);
    const deck = dimensions.deckClearance({ deckHeight, stroke, rodLength, compressionHeight });
    expect(deck).toBeGreaterThanOrEqual(0);
    expect(deck).toBeLessThanOrEqual(0.03);
  });

  test("the wall of a 4.155 in Marl is exactly 0.2, which floating point misses", () => {
    expect((4.615 - 4.155) / 2 - 0.03).not.toBe(0.2);
    expect(
      dimensions.cylinderWall({ barrelOutsideDiameter: 4.615, finishBore: 4.155, coreShift: 0.03 }),
    ).toBe(0.2);
  });
});

describe("rod to cam alone, of the demo's table", () => {
  test.each([
    ["steel", 6, 0.9, 0.2357],
    ["shouldered", 6, 0.9, 0.0263],
    ["shouldered", 5.85, 0.9, 0.0239],
    ["shouldered", 5.85, 0.84, 0.0839],
  ])("%s 4.000 stroke, %d rod, lobe %d under a cam at 4.520", (outline, rodLength, lobeRadius, distance) => {
    const rods = { stroke: 4, rodLength, bankAngle: Math.PI / 4, outline: outlineOf(outline) };
    expect(rodToCam({ ...rods, lobeRadius, camHeight: 4.52 }).value).toBe(distance);
  });
});

describe("stack-up, bore and small dimensions", () => {
  test("9.025 deck, 3.750 stroke, 5.700 rod, 1.425 pin height leaves 0.025 in (right triangle at top dead centre; own figures)", () => {
    const build = { deckHeight: 9.025, stroke: 3.75, rodLength: 5.7, compressionHeight: 1.425 };
    expect(dimensions.deckClearance(build)).toBe(0.025);
    expect(dimensions.deckClearance({ ...build, deckHeight: 8.99 })).toBe(-0.01);
  });

  test("stock left on the diameter", () => {
    expect(dimensions.deliveredBore({ finishBore: 4.125, stock: 0.03 })).toBe(4.095);
    expect(dimensions.deliveredBore({ finishBore: 4.125, stock: 0.005 })).toBe(4.12);
    expect(dimensions.deliveredBore({ finishBore: 4.125, stock: 0 })).toBe(4.125);
  });

  test("a lobe below its journal, a counterweight inside the case, a rod over its stroke", () => {
    expect(dimensions.lobeToJournal({ journalDiameter: 1.868, lobeRadius: 0.9 })).toBe(0.034);
    expect(dimensions.lobeToJournal({ journalDiameter: 1.868, lobeRadius: 0.95 })).toBe(-0.016);
    expect(dimensions.counterweightToCase({ caseSwingRadius: 3.73, counterweightRadius: 3.25 })).toBe(0.48);
    expect(dimensions.rodRatio({ rodLength: 6, stroke: 4 })).toBe(1.5);
  });

  test("impossible input has a sentence of its own", () => {
    expect(() => dimensions.rodRatio({ rodLength: 1.5, stroke: 4 })).toThrow("shorter than half the stroke");
    expect(() => dimensions.webBetweenBores({ boreSpacing: 4.4, finishBore: -4 })).toThrow(
      "the bore must be a length above zero",
    );
    expect(() => dimensions.webBetweenBores({ boreSpacing: 4.4, finishBore: Number.NaN })).toThrow(
      "the bore",
    );
    expect(() => dimensions.deliveredBore({ finishBore: 4, stock: -0.1 })).toThrow("must not be negative");
    expect(() => dimensions.deliveredBore({ finishBore: 4, stock: 4 })).toThrow("greater than the bore");
    expect(() => dimensions.lobeToJournal({ journalDiameter: 1.86801, lobeRadius: 0.9 })).toThrow("grid");
    expect(() =>
      measureOutline([
        [0, 0],
        [1, 1],
      ]),
    ).toThrow("three points");
    expect(() => rodToCase({ caseSwingRadius: 0, stroke: 4, outline: outlineOf("steel") })).toThrow(
      "above zero",
    );
  });
});

describe("weight", () => {
  const block = { familyWeight: 185, optionWeights: [], baseBore: 4, barrelLength: 5.65, cylinders: 8 };

  test("at the base bore it is the family's weight, plus the options", () => {
    expect(blockWeight({ ...block, deliveredBore: 4 })).toBe(185);
    expect(blockWeight({ ...block, optionWeights: [4, -1.5], deliveredBore: 4 })).toBe(187.5);
  });

  test("boring to 4.125 in takes the iron of eight rings at 0.258 lb/cu in (7.15 g/cm3, two foundries' pages)", () => {
    const ring = (Math.PI / 4) * (4.125 ** 2 - 4 ** 2) * 5.65;
    expect(blockWeight({ ...block, deliveredBore: 4.125 })).toBeCloseTo(185 - 8 * ring * 0.258, 9);
    // 7.15 g/cm3 in pounds per cubic inch: 1 lb/cu in = 27.6799047 g/cm3.
    expect(7.15 / 27.6799047).toBeCloseTo(0.258, 3);
  });

  test("a bore delivered under the base size leaves iron in", () => {
    expect(blockWeight({ ...block, deliveredBore: 3.97 })).toBeGreaterThan(185);
  });
});
