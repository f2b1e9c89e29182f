import type { FigureDefinition } from "./figure-definition.ts";
import { cylinderFigures } from "./figures-cylinders.ts";
import { powerFigures } from "./figures-power.ts";
import { rodFigures } from "./figures-rods.ts";

export type { FigureDefinition } from "./figure-definition.ts";

/**
 * Every figure, in the order they are shown. They read values (in inches; bankAngle in degrees) of the family and the options, typed
 * numbers and the word rodOutline by name; a figure that reads something unknown is undecided.
 */
export const figureDefinitions: readonly FigureDefinition[] = [
  ...cylinderFigures,
  ...rodFigures,
  ...powerFigures,
];
