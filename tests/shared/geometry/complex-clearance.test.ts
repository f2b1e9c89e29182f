import * as math from "mathjs";
import { describe, expect, test } from "vitest";
import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { rodToBarrel, rodToCam } from "#shared/geometry/rod-clearance.ts";
import type { Point } from "./dense-sweep.ts";

/**
 * The nearest approaches once more with a general library, in complex numbers: the block's plane with x to the right and i y up, the
 * rod's plane by dividing by its axis, where an outline point (a, c) is c - i a.
 */
interface Crank {
  stroke: number;
  rodLength: number;
  /** Radians from vertical, to the right. */
  bank: number;
}

const rodPlane = math.compile("(passed - pin) / ((wrist - pin) / l)");
const pinOf = math.compile("r * e^(i * (pi / 2 - bank - t))");
const wristOf = math.compile("(r * cos(t) + sqrt(l^2 - r^2 * sin(t)^2)) * e^(i * (pi / 2 - bank))");
const nearestOfEdge = math.compile("abs(q - p1 - max(0, min(1, re((q - p1) / (p2 - p1)))) * (p2 - p1))");
const windingOfEdge = math.compile("arg((p2 - q) / (p1 - q))");

function signedDistance(crank: Crank, outline: readonly Point[], passed: Point, t: number): number {
  const scope = { r: crank.stroke / 2, l: crank.rodLength, bank: crank.bank, t };
  const pin: unknown = pinOf.evaluate({ ...scope });
  const wrist: unknown = wristOf.evaluate({ ...scope });
  const q: unknown = rodPlane.evaluate({ ...scope, pin, wrist, passed: math.complex(...passed) });
  let [least, winding] = [Infinity, 0];
  outline.forEach(([a, c], at) => {
    const [a2, c2] = outline[(at + 1) % outline.length] ?? [a, c];
    const edge = { q, p1: math.complex(c, -a), p2: math.complex(c2, -a2) };
    least = Math.min(least, Number(nearestOfEdge.evaluate({ ...edge })));
    winding += Number(windingOfEdge.evaluate({ ...edge }));
  });
  return Math.abs(winding) > Math.PI ? -least : least;
}

/** Every two degrees of a turn, then ten times finer around the least, four times over. */
function leastOverTurn(distance: (t: number) => number): number {
  const around = (middle: number, step: number, steps: number): { t: number; least: number } => {
    const looks = Array.from({ length: 2 * steps + 1 }, (_, at) => middle + (at - steps) * step);
    return looks.map((t) => ({ t, least: distance(t) })).reduce((a, b) => (b.least < a.least ? b : a));
  };
  let [step, found] = [Math.PI / 90, around(Math.PI, Math.PI / 90, 90)];
  for (let finer = 0; finer < 4; finer += 1) {
    step /= 10;
    found = around(found.t, step, 12);
  }
  return found.least;
}

const b = Math.PI / 4;

describe("nearest approaches against complex numbers of a general library", () => {
  test.each([
    ["steel", 3.75, 6, 4.125],
    ["shouldered", 3.75, 6, 4.155],
    ["aluminium", 3.75, 6, 4.125],
    ["steel", 3.48, 5.7, 4],
    ["shouldered", 4, 5.85, 4],
  ])(
    "%s rod, stroke %d, rod %d, bore %d",
    (id, stroke, rodLength, bore) => {
      const outline = demoCatalogue.outlines.find((candidate) => candidate.id === id)?.points ?? [];
      const rods = { stroke, rodLength, bankAngle: b, outline };
      const right = { stroke, rodLength, bank: b };
      const toCam = leastOverTurn((t) => signedDistance(right, outline, [0, 4.52], t)) - 0.9;
      const cam = rodToCam({ ...rods, camHeight: 4.52, lobeRadius: 0.9 });
      expect(Math.abs(cam.value - toCam)).toBeLessThan(0.000_06);
      expect(Math.abs(signedDistance(right, outline, [0, 4.52], cam.angle) - 0.9 - toCam)).toBeLessThan(1e-6);

      const barrel = { bore, barrelBottom: 3.375, bankOffset: 0.92, bigEndWidth: 0.94, notch: 0 };
      const chord = Math.sqrt((bore / 2) ** 2 - 1.39 ** 2);
      const mirrored = outline.map(([a, c]): Point => [-a, c]);
      const left = { ...right, bank: -b };
      const edges = [chord, -chord].map((w): Point => [
        3.375 * Math.sin(b) + w * Math.cos(b),
        3.375 * Math.cos(b) - w * Math.sin(b),
      ]);
      const toBarrel = edges.map((edge) => leastOverTurn((t) => signedDistance(left, mirrored, edge, t)));
      const found = rodToBarrel({ ...rods, ...barrel });
      expect(found.rod).toBe("other");
      expect(Math.abs(found.value - Math.min(...toBarrel))).toBeLessThan(0.0001);
    },
    60_000,
  );
});
