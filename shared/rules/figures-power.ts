import type { Catalogue } from "../catalogue/catalogue.ts";
import { meanPistonSpeed, powerRange } from "../geometry/motion-and-power.ts";
import { peakPistonAcceleration, peakPistonSpeed } from "../geometry/piston-motion.ts";
import { figureFrom, type FigureDefinition } from "./figure-definition.ts";
import type { Reading } from "./reading.ts";

/** Nitrous adds the shot typed to what the same engine makes without it. */
const nitrous = "nitrous";

function powerLimit(reading: Reading, catalogue: Catalogue): { low: number; high: number } | null {
  const cubicInches = reading.figure("displacement");
  const rpm = reading.number("rpmAim");
  const induction = reading.chosen("induction");
  const shot = induction === nitrous ? reading.number("nitrousShot") : 0;
  const breathing = induction === nitrous ? "naturallyAspirated" : induction;
  const range = catalogue.bmepRanges.find(
    (candidate) => candidate.duty === reading.chosen("duty") && candidate.induction === breathing,
  );
  if (cubicInches === null || rpm === null || shot === null || range === undefined) return null;
  const { low, high } = powerRange({ cubicInches, rpm, low: range.low, high: range.high });
  return { low: low + shot, high: high + shot };
}

const powerReads = {
  unit: "hp",
  places: 0,
  formula: "mean effective pressure × displacement × engine speed/792,000, + the nitrous shot",
  values: ["bore", "stroke", "cylinders"],
  numbers: ["rpmAim", "nitrousShot"],
  choices: ["duty", "induction"],
} as const;

/** Piston speed and acceleration, and the power range. */
export const powerFigures: readonly FigureDefinition[] = [
  figureFrom(
    {
      id: "meanPistonSpeed",
      name: "Mean piston speed",
      unit: "m/s",
      places: 1,
      formula: "2 × stroke × engine speed",
    },
    { values: ["stroke"], numbers: ["rpmAim"] },
    ({ stroke, rpmAim }) => meanPistonSpeed({ stroke, rpm: rpmAim }).metresPerSecond,
  ),
  figureFrom(
    {
      id: "peakPistonSpeed",
      name: "Peak piston speed",
      unit: "m/s",
      places: 1,
      formula: "greatest speed of the pin height r cos t + √(L² − r² sin² t) at the engine speed",
    },
    { values: ["stroke", "rodLength"], numbers: ["rpmAim"] },
    ({ stroke, rodLength, rpmAim }) => peakPistonSpeed({ stroke, rodLength, rpm: rpmAim }).metresPerSecond,
  ),
  figureFrom(
    {
      id: "peakPistonAcceleration",
      name: "Peak piston acceleration",
      unit: "g",
      places: 0,
      formula: "greatest acceleration of the pin height r cos t + √(L² − r² sin² t), 1 g = 9.80665 m/s²",
    },
    { values: ["stroke", "rodLength"], numbers: ["rpmAim"] },
    ({ stroke, rodLength, rpmAim }) => peakPistonAcceleration({ stroke, rodLength, rpm: rpmAim }).gravities,
  ),
  {
    id: "powerLow",
    name: "Engines of this kind usually make, low",
    ...powerReads,
    compute: (reading, catalogue) => powerLimit(reading, catalogue)?.low ?? null,
  },
  {
    id: "powerHigh",
    name: "Engines of this kind usually make, high",
    ...powerReads,
    compute: (reading, catalogue) => powerLimit(reading, catalogue)?.high ?? null,
  },
];
