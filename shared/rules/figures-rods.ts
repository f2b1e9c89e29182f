import type { Catalogue } from "../catalogue/catalogue.ts";
import * as dimensions from "../geometry/dimensions.ts";
import { rodToBarrel, rodToCam, type NearestApproach } from "../geometry/rod-clearance.ts";
import { rodToCase, type OutlinePoint } from "../geometry/rod-outline.ts";
import { figureFrom, knownOf, type Described, type FigureDefinition } from "./figure-definition.ts";
import type { Reading } from "./reading.ts";

function outlineOf(reading: Reading, catalogue: Catalogue): readonly OutlinePoint[] | null {
  const word = reading.word("rodOutline");
  return catalogue.outlines.find(({ id }) => id === word)?.points ?? null;
}

/** A least distance over a whole turn of the crank, with the place where it is. */
function sweptFigure<const Value extends string>(
  described: Described,
  values: readonly Value[],
  nearest: (
    known: Record<Value, number>,
    bank: { bankAngle: number; outline: readonly OutlinePoint[] },
  ) => NearestApproach,
): FigureDefinition {
  const approach = (reading: Reading, catalogue: Catalogue): NearestApproach | null => {
    const known = knownOf(reading, { values });
    const degrees = reading.value("bankAngle");
    const outline = outlineOf(reading, catalogue);
    if (known === null || degrees === null || outline === null) return null;
    return nearest(known, { bankAngle: (degrees * Math.PI) / 180, outline });
  };
  return {
    ...described,
    values: [...values, "bankAngle"],
    words: ["rodOutline"],
    compute: (reading, catalogue) => approach(reading, catalogue)?.value ?? null,
    at(reading, catalogue) {
      const found = approach(reading, catalogue);
      if (found === null) return null;
      const { angle, bank, rod, place, facing } = found;
      return { angle, bank, rod, place, facing };
    },
  };
}

/** Rods, counterweights and skirts in the case; the cam over them. */
export const rodFigures: readonly FigureDefinition[] = [
  {
    id: "rodToCase",
    name: "Rod to case",
    unit: "in",
    places: 4,
    formula: "case swing radius − (stroke/2 + greatest distance of the rod outline from the crankpin)",
    values: ["caseSwingRadius", "stroke"],
    words: ["rodOutline"],
    compute(reading, catalogue) {
      const known = knownOf(reading, { values: ["caseSwingRadius", "stroke"] });
      const outline = outlineOf(reading, catalogue);
      return known && outline ? rodToCase({ ...known, outline }) : null;
    },
  },
  sweptFigure(
    {
      id: "rodToCam",
      name: "Rod to cam",
      unit: "in",
      places: 4,
      formula:
        "least distance of the rod outline from the cam lobe circle over a whole turn; negative inside",
    },
    ["stroke", "rodLength", "camHeight", "lobeRadius"],
    (known, bank) => rodToCam({ ...known, ...bank }),
  ),
  sweptFigure(
    {
      id: "rodToBarrel",
      name: "Rod to barrel",
      unit: "in",
      places: 4,
      formula:
        "least distance of both rods on the crankpin from the barrel's lower inner edges over a whole turn, + the notch of the stroke clearance; negative inside",
    },
    ["stroke", "rodLength", "bore", "barrelBottom", "bankOffset", "bigEndWidth", "notch"],
    (known, bank) => rodToBarrel({ ...known, ...bank }),
  ),
  figureFrom(
    {
      id: "counterweightToCase",
      name: "Counterweight to case",
      unit: "in",
      places: 4,
      formula: "case swing radius − counterweight radius",
    },
    { values: ["caseSwingRadius", "counterweightRadius"] },
    dimensions.counterweightToCase,
  ),
  figureFrom(
    {
      id: "counterweightToBoss",
      name: "Counterweight to pin boss",
      unit: "in",
      places: 4,
      formula: "(rod length − stroke/2) − boss drop − counterweight radius",
    },
    { values: ["rodLength", "stroke", "bossDrop", "counterweightRadius"] },
    dimensions.counterweightToBoss,
  ),
  figureFrom(
    {
      id: "skirtExposure",
      name: "Skirt exposure",
      unit: "in",
      places: 4,
      formula: "height of the barrel bottom − (rod length − stroke/2 − skirt length)",
    },
    { values: ["barrelBottom", "rodLength", "stroke", "skirtLength"] },
    dimensions.skirtExposure,
  ),
  figureFrom(
    {
      id: "lobeToJournal",
      name: "Cam lobe to journal",
      unit: "in",
      places: 4,
      formula: "cam journal diameter/2 − lobe radius",
    },
    { values: ["journalDiameter", "lobeRadius"] },
    dimensions.lobeToJournal,
  ),
  figureFrom(
    { id: "rodRatio", name: "Rod ratio", unit: "ratio", places: 3, formula: "rod length/stroke" },
    { values: ["rodLength", "stroke"] },
    dimensions.rodRatio,
  ),
];
