import { clearanceVolume, compressionRatio } from "../geometry/compression.ts";
import * as dimensions from "../geometry/dimensions.ts";
import { displacement } from "../geometry/displacement.ts";
import { figureFrom, knownOf, type FigureDefinition } from "./figure-definition.ts";
import type { Reading } from "./reading.ts";

const displacementReads = ["bore", "stroke", "cylinders"] as const;
const deckReads = ["deckHeight", "stroke", "rodLength", "compressionHeight"] as const;

const skirts = ["skirt1", "skirt2", "skirt3", "skirt4", "skirt5", "skirt6", "skirt7", "skirt8"] as const;
const honedNumbers = [...skirts, "pistonClearance"] as const;

/** The cylinders honed to measured pistons, in; null unless the option that reads those numbers is chosen and all are known. */
function honedTo(reading: Reading): number[] | null {
  const known = knownOf(reading, { numbers: honedNumbers });
  if (known === null) return null;
  return dimensions.honedCylinders({
    skirts: skirts.map((skirt) => known[skirt]),
    clearance: known.pistonClearance,
  });
}

/**
 * The bore that counts for walls and gaskets, in: the largest cylinder when honed to measured pistons; else, and while they are not
 * known, the bore that is chosen.
 */
function widest(reading: Reading): number | null {
  const cylinders = honedTo(reading);
  return cylinders === null ? reading.value("bore") : Math.max(...cylinders);
}

const clearanceReads = {
  values: ["bore", ...deckReads],
  numbers: ["chamber", "gasketBore", "gasketThickness", "dish"],
} as const;

function clearance(reading: Reading): number | null {
  const known = knownOf(reading, clearanceReads);
  if (known === null) return null;
  return clearanceVolume({ ...known, deckClearance: dimensions.deckClearance(known), crown: known.dish });
}

/** Displacement, bore, wall, deck and compression. */
export const cylinderFigures: readonly FigureDefinition[] = [
  figureFrom(
    {
      id: "displacement",
      name: "Displacement",
      unit: "cu in",
      places: 1,
      formula: "π/4 × bore² × stroke × cylinders",
    },
    { values: displacementReads },
    (known) => displacement(known).cubicInches,
  ),
  figureFrom(
    {
      id: "displacementLitres",
      name: "Displacement",
      unit: "L",
      places: 3,
      formula: "π/4 × bore² × stroke × cylinders, 1 cu in = 16.387064 cm³",
    },
    { values: displacementReads },
    (known) => displacement(known).litres,
  ),
  {
    id: "deliveredBore",
    name: "Bore as delivered",
    unit: "in",
    places: 4,
    formula:
      "finish bore − stock left on the diameter; honed to measured pistons: the largest skirt + clearance asked",
    values: ["bore", "stock"],
    numbers: honedNumbers,
    compute(reading) {
      const cylinders = honedTo(reading);
      if (cylinders !== null) return Math.max(...cylinders);
      const known = knownOf(reading, { values: ["bore", "stock"] });
      return known && dimensions.deliveredBore({ finishBore: known.bore, stock: known.stock });
    },
  },
  {
    id: "cylinderFromBore",
    name: "Cylinder from chosen bore, greatest",
    unit: "in",
    places: 4,
    formula: "greatest difference of skirt + clearance asked from the finish bore, over the eight cylinders",
    values: ["bore"],
    numbers: honedNumbers,
    shownOnceKnown: true,
    compute(reading) {
      const cylinders = honedTo(reading);
      const finishBore = reading.value("bore");
      if (cylinders === null || finishBore === null) return null;
      return dimensions.greatestFromBore({ cylinders, finishBore });
    },
  },
  {
    id: "wall",
    name: "Cylinder wall, nominal least",
    unit: "in",
    places: 4,
    formula:
      "(barrel outside diameter − finish bore, or the largest honed cylinder)/2 − core-shift allowance",
    values: ["barrelOutsideDiameter", "bore", "coreShift"],
    numbers: honedNumbers,
    compute(reading) {
      const known = knownOf(reading, { values: ["barrelOutsideDiameter", "coreShift"] });
      const finishBore = widest(reading);
      return known && finishBore !== null ? dimensions.cylinderWall({ ...known, finishBore }) : null;
    },
  },
  figureFrom(
    {
      id: "web",
      name: "Web between bores",
      unit: "in",
      places: 4,
      formula: "bore spacing − finish bore; negative = the bores run into each other",
    },
    { values: ["boreSpacing", "bore"] },
    ({ boreSpacing, bore }) =>
      bore > boreSpacing
        ? -dimensions.webBetweenBores({ boreSpacing: bore, finishBore: boreSpacing })
        : dimensions.webBetweenBores({ boreSpacing, finishBore: bore }),
  ),
  {
    id: "gasketOverBore",
    name: "Gasket bore over the bore",
    unit: "in",
    places: 4,
    formula: "gasket bore − finish bore, or the largest honed cylinder",
    values: ["bore"],
    numbers: ["gasketBore", ...honedNumbers],
    shownOnceKnown: true,
    compute(reading) {
      const gasketBore = reading.number("gasketBore");
      const bore = widest(reading);
      return gasketBore === null || bore === null ? null : dimensions.gasketOverBore({ gasketBore, bore });
    },
  },
  figureFrom(
    {
      id: "deckClearance",
      name: "Deck clearance",
      unit: "in",
      places: 4,
      formula:
        "deck height − (stroke/2 + rod length + compression height); negative = piston proud of the deck",
    },
    { values: deckReads },
    dimensions.deckClearance,
  ),
  figureFrom(
    {
      id: "pistonToHead",
      name: "Piston to head",
      unit: "in",
      places: 4,
      formula: "deck clearance + gasket thickness",
    },
    { values: deckReads, numbers: ["gasketThickness"] },
    dimensions.pistonToHead,
  ),
  {
    id: "clearanceVolume",
    name: "Clearance volume, one cylinder",
    unit: "cc",
    places: 1,
    formula:
      "chamber + π/4 × gasket bore² × gasket thickness + π/4 × bore² × deck clearance + dish (a dome is negative)",
    ...clearanceReads,
    shownOnceKnown: true,
    compute: clearance,
  },
  {
    id: "compressionRatio",
    name: "Compression ratio",
    unit: "ratio",
    places: 2,
    formula: "(swept volume + clearance volume)/clearance volume",
    ...clearanceReads,
    compute(reading) {
      const left = clearance(reading);
      const known = knownOf(reading, clearanceReads);
      if (known === null || left === null || left <= 0) return null;
      const swept = displacement({ bore: known.bore, stroke: known.stroke, cylinders: 1 });
      return compressionRatio({ swept: swept.cubicCentimetres, clearance: left });
    },
  },
];
