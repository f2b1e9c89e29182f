import { catalogueSchema, type Catalogue } from "#shared/catalogue/catalogue.ts";
import { castingChoices } from "./choices-casting.ts";
import { boreAndDeckChoices } from "./choices-bore-and-deck.ts";
import { bottomEndChoices } from "./choices-bottom-end.ts";
import { extraChoices } from "./choices-extras.ts";
import { finishingChoices } from "./choices-finishing.ts";
import { valveGearChoices } from "./choices-valve-gear.ts";
import { families } from "./families.ts";
import { numbers } from "./numbers.ts";
import { outlines } from "./outlines.ts";
import { rules } from "./rules.ts";
import { steps } from "./steps.ts";

/** Mean effective pressures, psi, from memory; nitrous is left out, for its range needs the shot. */
const naturallyAspirated: Record<string, [low: number, high: number]> = {
  street: [110, 140],
  circleTrack: [140, 175],
  drag: [165, 205],
  marine: [140, 175],
  offRoad: [140, 175],
};

const bmepRanges = Object.entries(naturallyAspirated).flatMap(([duty, [low, high]]) => [
  { duty, induction: "naturallyAspirated", low, high },
  { duty, induction: "boosted", low: 180, high: 300 },
]);

/** The demo shop's catalogue: three families, invented figures. */
export const demoCatalogue: Catalogue = catalogueSchema.parse({
  version: 1,
  name: "Opening catalogue",
  publishedOn: "2026-01-05",
  families,
  steps,
  choices: [
    ...castingChoices,
    ...boreAndDeckChoices,
    ...bottomEndChoices,
    ...valveGearChoices,
    ...finishingChoices,
    ...extraChoices,
  ],
  numbers,
  rules,
  outlines,
  bmepRanges,
});
