import { givenAbove } from "./given.ts";

/**
 * Bolts: preload and torque. Stress areas from a handbook copy of the B1.1 table, proof strengths from a fastener maker's copy of the
 * J429 table, the nut factors from a design handbook page. T = K F d is empirical and scatters by a quarter and more: the figures are
 * for the build sheet, with its caution; the maker of a stud kit gives the kit's own torque.
 */

const threads = {
  "3/8-16": { diameter: 0.375, stressArea: 0.0775 },
  "3/8-24": { diameter: 0.375, stressArea: 0.0878 },
  "7/16-14": { diameter: 0.4375, stressArea: 0.1063 },
  "7/16-20": { diameter: 0.4375, stressArea: 0.1187 },
  "1/2-13": { diameter: 0.5, stressArea: 0.1419 },
  "1/2-20": { diameter: 0.5, stressArea: 0.1599 },
  "9/16-12": { diameter: 0.5625, stressArea: 0.182 },
  "9/16-18": { diameter: 0.5625, stressArea: 0.203 },
} as const;

/** A thread of the table: nominal diameter, in, and threads per inch. */
type Thread = keyof typeof threads;

/** Proof strength, psi, of the sizes in the table. */
const proofStrength = { 2: 55_000, 5: 85_000, 8: 120_000 } as const;

type BoltGrade = keyof typeof proofStrength;

/** Share of the proof load for joints that are taken apart again. */
const reusableShare = 0.75;

/** Nut factors K without unit: plain dry steel, and any lubricant. */
const nutFactor = { dry: 0.2, oiled: 0.15 } as const;

/** Tensile stress area, sq in, of an inch thread: pi/4 (d - 0.9743/n)². Inches, threads per inch. */
export function stressArea(input: { diameter: number; threadsPerInch: number }): number {
  givenAbove("the diameter", input.diameter);
  givenAbove("the threads per inch", input.threadsPerInch);
  const core = input.diameter - 0.9743 / input.threadsPerInch;
  givenAbove("the core of the thread", core);
  return (Math.PI / 4) * core * core;
}

/** T = K F d: torque, lbf in, of a preload (lbf) on a nominal diameter (in) with a nut factor. */
export function torque(input: { preload: number; diameter: number; nutFactor: number }): number {
  givenAbove("the preload", input.preload);
  givenAbove("the diameter", input.diameter);
  givenAbove("the nut factor", input.nutFactor);
  return input.nutFactor * input.preload * input.diameter;
}

/** Preload of a bolt, lbf: three quarters of its proof load; and the torque for it, lbf ft, dry and oiled. */
export function boltTightening(input: { thread: Thread; grade: BoltGrade }): {
  preload: number;
  dryTorque: number;
  oiledTorque: number;
} {
  const { diameter, stressArea: area } = threads[input.thread];
  const preload = reusableShare * proofStrength[input.grade] * area;
  return {
    preload,
    dryTorque: torque({ preload, diameter, nutFactor: nutFactor.dry }) / 12,
    oiledTorque: torque({ preload, diameter, nutFactor: nutFactor.oiled }) / 12,
  };
}
