import type { Catalogue } from "../catalogue/catalogue.ts";
import * as dimensions from "../geometry/dimensions.ts";
import { displacement } from "../geometry/displacement.ts";
import { meanPistonSpeed, powerRange } from "../geometry/motion-and-power.ts";
import { rodToCase } from "../geometry/rod-outline.ts";
import type { FigureUnit } from "./evaluation.ts";
import type { Reading } from "./reading.ts";

/** One computed figure: what it reads, and how it is computed from what is known. */
export interface FigureDefinition {
  id: string;
  name: string;
  unit: FigureUnit;
  places: number;
  formula: string;
  /** Named values, words, typed numbers and choices that it reads; missing one of them it is undecided. */
  values: readonly string[];
  words?: readonly string[];
  numbers?: readonly string[];
  choices?: readonly string[];
  compute(reading: Reading, catalogue: Catalogue): number | null;
}

/** A figure that is computed from named values alone. */
function fromValues<const Name extends string>(
  described: Pick<FigureDefinition, "id" | "name" | "unit" | "places" | "formula">,
  values: readonly Name[],
  compute: (known: Record<Name, number>) => number,
): FigureDefinition {
  return {
    ...described,
    values,
    compute(reading) {
      const known: Partial<Record<Name, number>> = {};
      for (const name of values) {
        const value = reading.value(name);
        if (value === null) return null;
        known[name] = value;
      }
      return complete(known, values) ? compute(known) : null;
    },
  };
}

function complete<Name extends string>(
  known: Partial<Record<Name, number>>,
  names: readonly Name[],
): known is Record<Name, number> {
  return names.every((name) => known[name] !== undefined);
}

function powerLimit(reading: Reading, catalogue: Catalogue): { low: number; high: number } | null {
  const cubicInches = reading.figure("displacement");
  const rpm = reading.number("rpmAim");
  const range = catalogue.bmepRanges.find(
    ({ duty, induction }) => duty === reading.chosen("duty") && induction === reading.chosen("induction"),
  );
  if (cubicInches === null || rpm === null || range === undefined) return null;
  return powerRange({ cubicInches, rpm, low: range.low, high: range.high });
}

const displacementReads = ["bore", "stroke", "cylinders"] as const;

/** Every figure of this edition, in the order they are shown. */
export const figureDefinitions: readonly FigureDefinition[] = [
  fromValues(
    {
      id: "displacement",
      name: "Displacement",
      unit: "cu in",
      places: 1,
      formula: "π/4 × bore² × stroke × cylinders",
    },
    displacementReads,
    (known) => displacement(known).cubicInches,
  ),
  fromValues(
    {
      id: "displacementLitres",
      name: "Displacement",
      unit: "L",
      places: 3,
      formula: "π/4 × bore² × stroke × cylinders, 1 cu in = 16.387064 cm³",
    },
    displacementReads,
    (known) => displacement(known).litres,
  ),
  fromValues(
    {
      id: "deliveredBore",
      name: "Bore as delivered",
      unit: "in",
      places: 4,
      formula: "finish bore − stock left on the diameter",
    },
    ["bore", "stock"],
    ({ bore, stock }) => dimensions.deliveredBore({ finishBore: bore, stock }),
  ),
  fromValues(
    {
      id: "wall",
      name: "Cylinder wall, nominal least",
      unit: "in",
      places: 4,
      formula: "(barrel outside diameter − finish bore)/2 − core-shift allowance",
    },
    ["barrelOutsideDiameter", "bore", "coreShift"],
    ({ barrelOutsideDiameter, bore, coreShift }) =>
      dimensions.cylinderWall({ barrelOutsideDiameter, finishBore: bore, coreShift }),
  ),
  fromValues(
    { id: "web", name: "Web between bores", unit: "in", places: 4, formula: "bore spacing − finish bore" },
    ["boreSpacing", "bore"],
    ({ boreSpacing, bore }) => dimensions.webBetweenBores({ boreSpacing, finishBore: bore }),
  ),
  fromValues(
    {
      id: "deckClearance",
      name: "Deck clearance",
      unit: "in",
      places: 4,
      formula:
        "deck height − (stroke/2 + rod length + compression height); negative = piston proud of the deck",
    },
    ["deckHeight", "stroke", "rodLength", "compressionHeight"],
    dimensions.deckClearance,
  ),
  {
    id: "rodToCase",
    name: "Rod to case",
    unit: "in",
    places: 4,
    formula: "case swing radius − (stroke/2 + greatest distance of the rod outline from the crankpin)",
    values: ["caseSwingRadius", "stroke"],
    words: ["rodOutline"],
    compute(reading, catalogue) {
      const caseSwingRadius = reading.value("caseSwingRadius");
      const stroke = reading.value("stroke");
      const word = reading.word("rodOutline");
      const outline = catalogue.outlines.find((candidate) => candidate.id === word);
      if (caseSwingRadius === null || stroke === null || outline === undefined) return null;
      return rodToCase({ caseSwingRadius, stroke, outline: outline.points });
    },
  },
  fromValues(
    {
      id: "counterweightToCase",
      name: "Counterweight to case",
      unit: "in",
      places: 4,
      formula: "case swing radius − counterweight radius",
    },
    ["caseSwingRadius", "counterweightRadius"],
    dimensions.counterweightToCase,
  ),
  fromValues(
    {
      id: "counterweightToBoss",
      name: "Counterweight to pin boss",
      unit: "in",
      places: 4,
      formula: "(rod length − stroke/2) − boss drop − counterweight radius",
    },
    ["rodLength", "stroke", "bossDrop", "counterweightRadius"],
    dimensions.counterweightToBoss,
  ),
  fromValues(
    {
      id: "skirtExposure",
      name: "Skirt exposure",
      unit: "in",
      places: 4,
      formula: "height of the barrel bottom − (rod length − stroke/2 − skirt length)",
    },
    ["barrelBottom", "rodLength", "stroke", "skirtLength"],
    dimensions.skirtExposure,
  ),
  fromValues(
    {
      id: "lobeToJournal",
      name: "Cam lobe to journal",
      unit: "in",
      places: 4,
      formula: "cam journal diameter/2 − lobe radius",
    },
    ["journalDiameter", "lobeRadius"],
    dimensions.lobeToJournal,
  ),
  fromValues(
    { id: "rodRatio", name: "Rod ratio", unit: "ratio", places: 3, formula: "rod length/stroke" },
    ["rodLength", "stroke"],
    dimensions.rodRatio,
  ),
  {
    id: "meanPistonSpeed",
    name: "Mean piston speed",
    unit: "m/s",
    places: 1,
    formula: "2 × stroke × engine speed",
    values: ["stroke"],
    numbers: ["rpmAim"],
    compute(reading) {
      const stroke = reading.value("stroke");
      const rpm = reading.number("rpmAim");
      return stroke === null || rpm === null ? null : meanPistonSpeed({ stroke, rpm }).metresPerSecond;
    },
  },
  {
    id: "powerLow",
    name: "Engines of this kind usually make, low",
    unit: "hp",
    places: 0,
    formula: "mean effective pressure × displacement × engine speed/792,000",
    values: displacementReads,
    numbers: ["rpmAim"],
    choices: ["duty", "induction"],
    compute: (reading, catalogue) => powerLimit(reading, catalogue)?.low ?? null,
  },
  {
    id: "powerHigh",
    name: "Engines of this kind usually make, high",
    unit: "hp",
    places: 0,
    formula: "mean effective pressure × displacement × engine speed/792,000",
    values: displacementReads,
    numbers: ["rpmAim"],
    choices: ["duty", "induction"],
    compute: (reading, catalogue) => powerLimit(reading, catalogue)?.high ?? null,
  },
];
