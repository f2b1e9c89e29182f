import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { rodToBarrel, rodToCam, type NearestApproach } from "#shared/geometry/rod-clearance.ts";
import { outlineProblem } from "#shared/geometry/rod-outline.ts";
import {
  cornersAt,
  denseRodToBarrel,
  denseRodToCam,
  signedDistance,
  type BarrelAndRods,
  type Point,
} from "./dense-sweep.ts";

const quarter = Math.PI / 4;

function outlineOf(id: string): readonly Point[] {
  const outline = demoCatalogue.outlines.find((candidate) => candidate.id === id);
  if (outline === undefined) throw new Error(`no outline ${id}`);
  return outline.points;
}

const cam = { camHeight: 4.52, lobeRadius: 0.9 };
const marl: BarrelAndRods = {
  stroke: 3.75,
  rodLength: 6,
  bankAngle: quarter,
  outline: outlineOf("steel"),
  bore: 4.125,
  barrelBottom: 3.375,
  bankOffset: 0.92,
  bigEndWidth: 0.94,
  notch: 0,
};

/** A rod with a shoulder on one side only, so that its mirror image matters; and one that is hollow at the top. */
const lopsided: readonly Point[] = [
  [-1.2, -1.3],
  [1.2, -1.3],
  [1.65, 0.4],
  [0.5, 1.3],
  [-0.5, 1.3],
  [-1.1, 0.5],
];
const hollow: readonly Point[] = [
  [-1.3, -1.2],
  [1.3, -1.2],
  [1.5, 0.5],
  [1.2, 1.3],
  [0.4, 0.7],
  [-0.4, 0.7],
  [-1.2, 1.3],
  [-1.3, 0.5],
];

/** On the shop's grid of 0.0001 in. */
const grid = (from: number, to: number) =>
  fc.integer({ min: Math.round(from * 10_000), max: Math.round(to * 10_000) }).map((units) => units / 10_000);

/** Corners around the crankpin at growing angles, each at its own distance: often hollow, never crossing. */
const starOutline = fc
  .array(fc.tuple(grid(0.7, 1.7), grid(0.05, 0.95)), { minLength: 4, maxLength: 12 })
  .map((corners) =>
    corners.map(([reach, share], at): Point => {
      const angle = (2 * Math.PI * (at + share)) / corners.length;
      return [reach * Math.cos(angle), reach * Math.sin(angle)];
    }),
  )
  .filter((points) => outlineProblem(points) === null);

const convexOutline = fc
  .tuple(grid(0.9, 1.5), grid(0.9, 1.5), fc.integer({ min: 3, max: 14 }), grid(-0.3, 0.3))
  .map(([wide, tall, corners, shift]) =>
    Array.from({ length: corners }, (_, at): Point => {
      const angle = (2 * Math.PI * at) / corners + 0.3;
      return [shift + wide * Math.cos(angle), tall * Math.sin(angle)];
    }),
  );

const anyRods = fc.record({
  stroke: grid(2.8, 5),
  rodLength: grid(5, 7.5),
  bankAngle: fc.constantFrom(quarter, Math.PI / 6, 0.2),
  outline: fc.oneof(
    starOutline,
    convexOutline,
    fc.constantFrom(...demoCatalogue.outlines.map(({ points }) => points), lopsided, hollow),
  ),
});

describe("against a dense sweep of both banks and both rods, written apart", () => {
  test.each(["steel", "shouldered", "aluminium", "steelLarge", "shoulderedLarge", "aluminiumLarge"])(
    "the demo's %s rod",
    (id) => {
      const rods = { ...marl, outline: outlineOf(id) };
      expect(Math.abs(rodToCam({ ...rods, ...cam }).value - denseRodToCam({ ...rods, ...cam }))).toBeLessThan(
        0.0001,
      );
      const least = Math.min(denseRodToBarrel(rods, "own"), denseRodToBarrel(rods, "other"));
      expect(Math.abs(rodToBarrel(rods).value - least)).toBeLessThan(0.0001);
    },
  );

  test.each([
    ["lopsided", lopsided],
    ["hollow", hollow],
  ])("a %s outline, mirrored on the left bank", (_, outline) => {
    const rods = { ...marl, outline };
    expect(Math.abs(rodToCam({ ...rods, ...cam }).value - denseRodToCam({ ...rods, ...cam }))).toBeLessThan(
      0.0001,
    );
    const least = Math.min(denseRodToBarrel(rods, "own"), denseRodToBarrel(rods, "other"));
    expect(Math.abs(rodToBarrel(rods).value - least)).toBeLessThan(0.0001);
  });

  test("rod to cam of random geometries, within 0.0002 in", () => {
    fc.assert(
      fc.property(anyRods, grid(3.5, 6), grid(0.6, 1.3), (rods, camHeight, lobeRadius) => {
        const input = { ...rods, camHeight, lobeRadius };
        expect(Math.abs(rodToCam(input).value - denseRodToCam(input))).toBeLessThan(0.0002);
      }),
      { numRuns: 40 },
    );
  }, 60_000);

  test("rod to barrel of random geometries, within 0.0002 in, and the rod that governs", () => {
    fc.assert(
      fc.property(
        anyRods,
        fc.record({
          bore: grid(2.5, 4.7),
          barrelBottom: grid(2.4, 4.2),
          bankOffset: grid(0, 1),
          bigEndWidth: grid(0.7, 1),
          notch: fc.constantFrom(0, 0.11, 0.19),
        }),
        (rods, barrel) => {
          const input = { ...rods, ...barrel };
          const found = rodToBarrel(input);
          const own = denseRodToBarrel(input, "own");
          const other = denseRodToBarrel(input, "other");
          expect(Math.abs(found.value - Math.min(own, other))).toBeLessThan(0.0002);
          if (Math.abs(own - other) > 0.0004) expect(found.rod).toBe(own < other ? "own" : "other");
        },
      ),
      { numRuns: 20 },
    );
  }, 60_000);
});

describe("where the nearest approach is", () => {
  const pinAngleOf = ({ angle }: NearestApproach, bankAngle: number): number => bankAngle + angle;
  const apart = ({ place, facing }: NearestApproach): number =>
    Math.hypot(place[0] - facing[0], place[1] - facing[1]);

  const outlines: [string, readonly Point[]][] = [
    ["steel", outlineOf("steel")],
    ["aluminium", outlineOf("aluminium")],
    ["lopsided", lopsided],
    ["hollow", hollow],
  ];

  test.each(outlines)(
    "of a %s rod to the cam: on the rod at the angle told, and as far away as told",
    (_, outline) => {
      const rods = { ...marl, outline };
      const found = rodToCam({ ...rods, ...cam });
      const corners = cornersAt(rods, "right", pinAngleOf(found, quarter));
      expect(found).toMatchObject({ bank: "right", rod: "own" });
      expect(signedDistance(found.place, corners)).toBeCloseTo(0, 9);
      expect(Math.hypot(found.facing[0], found.facing[1] - cam.camHeight)).toBeCloseTo(cam.lobeRadius, 9);
      expect(Math.abs(apart(found) - Math.abs(found.value))).toBeLessThanOrEqual(0.000_051);
    },
  );

  test.each(outlines)(
    "of a %s rod to the barrel: on the rod that governs, facing the barrel's lower edge",
    (_, outline) => {
      const rods = { ...marl, outline };
      const found = rodToBarrel(rods);
      const swinging = found.rod === "own" ? "right" : "left";
      const corners = cornersAt(rods, swinging, pinAngleOf(found, quarter));
      expect(signedDistance(found.place, corners)).toBeCloseTo(0, 9);
      const height = (found.facing[0] + found.facing[1]) * Math.SQRT1_2;
      expect(height).toBeCloseTo(3.375, 9);
      expect(Math.abs(apart(found) - Math.abs(found.value))).toBeLessThanOrEqual(0.000_051);
      expect(Math.sign(signedDistance(found.facing, corners))).toBe(Math.sign(found.value));
    },
  );

  test("the other bank's rod governs a usual block; a rod too far along the crank does not pass the barrel", () => {
    expect(rodToBarrel(marl).rod).toBe("other");
    const alone = rodToBarrel({ ...marl, bankOffset: 1.7 });
    expect(alone.rod).toBe("own");
    expect(Math.abs(alone.value - denseRodToBarrel(marl, "own"))).toBeLessThan(0.0001);
  });

  test("the notch is added to the ten-thousandth", () => {
    const bare = rodToBarrel(marl);
    expect(rodToBarrel({ ...marl, notch: 0.11 })).toEqual({
      ...bare,
      value: Number((bare.value + 0.11).toFixed(4)),
    });
  });

  test("the same question has the same answer, and a changed one its own", () => {
    expect(rodToCam({ ...marl, ...cam })).toEqual(rodToCam({ ...marl, ...cam, outline: [...marl.outline] }));
    expect(rodToCam({ ...marl, ...cam, lobeRadius: 0.95 }).value).toBe(
      Number((rodToCam({ ...marl, ...cam }).value - 0.05).toFixed(4)),
    );
  });
});

describe("impossible input has a sentence of its own, and never NaN", () => {
  test.each([
    [{ rodLength: 1.8 }, "the rod is shorter than half the stroke"],
    [{ rodLength: 1.875 }, "the rod is shorter than half the stroke"],
    [{ stroke: -3.75 }, "the stroke must be a length above zero"],
    [{ stroke: Number.NaN }, "the stroke must be a length above zero"],
    [{ rodLength: Number.POSITIVE_INFINITY }, "the rod length must be a length above zero"],
    [{ bore: 0 }, "the bore must be a length above zero"],
    [{ barrelBottom: -1 }, "the height of the barrel bottom must be a length above zero"],
    [{ bankOffset: -0.1 }, "the bank offset must not be negative"],
    [{ bigEndWidth: Number.NaN }, "the big end's width must not be negative"],
    [{ notch: -0.11 }, "the notch must not be negative"],
    [{ bankAngle: Number.NaN }, "the bank angle must lie between upright and flat"],
    [{ bankAngle: Math.PI / 2 }, "the bank angle must lie between upright and flat"],
  ])("%o", (wrong, sentence) => {
    expect(() => rodToBarrel({ ...marl, ...wrong })).toThrow(sentence);
  });

  test("of the cam", () => {
    expect(() => rodToCam({ ...marl, camHeight: 0, lobeRadius: 0.9 })).toThrow("the cam height");
    expect(() => rodToCam({ ...marl, camHeight: 4.52, lobeRadius: -0.9 })).toThrow("the lobe radius");
  });

  const square: Point[] = [
    [-1, -1],
    [1, -1],
    [1, 1],
    [-1, 1],
  ];
  test.each<[string, Point[], string]>([
    ["two points", square.slice(0, 2), "at least three points"],
    [
      "a bow tie",
      [square[0], square[2], square[1], square[3]].map((p): Point => p ?? [0, 0]),
      "crosses itself",
    ],
    ["a spike that runs back", [...square, [-1, 2], [-1, 0]], "crosses itself"],
    ["a corner on an edge", [...square.slice(0, 3), [0, -1], [-1, 1]], "crosses itself"],
    ["the same point twice", [[-1, -1], ...square], "same point twice"],
    ["no number", [...square, [Number.NaN, 0]], "finite points"],
    [
      "three points in a line",
      [
        [0, 0],
        [1, 1],
        [2, 2],
      ],
      "crosses itself",
    ],
  ])("an outline with %s", (_, outline, sentence) => {
    expect(outlineProblem(outline)).toContain(sentence);
    expect(() => rodToBarrel({ ...marl, outline })).toThrow(sentence);
  });

  test("an outline with a point in the middle of a straight edge is sound, and measures the same", () => {
    const split: Point[] = [[-1, -1], [0, -1], ...square.slice(1)];
    expect(outlineProblem(split)).toBeNull();
    expect(rodToBarrel({ ...marl, outline: split })).toEqual(rodToBarrel({ ...marl, outline: square }));
  });
});
