import type { RuleDocument } from "./document.ts";
import { castingRules } from "./rules-casting.ts";
import { finishingRules } from "./rules-finishing.ts";
import { fitRules } from "./rules-fit.ts";
import { loadRules } from "./rules-load.ts";
import { valveGearRules } from "./rules-valve-gear.ts";

/** Every rule of the demo shop; invented limits say so, the rest is common practice or from memory. */
export const rules: RuleDocument[] = [
  ...castingRules,
  ...loadRules,
  ...fitRules,
  ...valveGearRules,
  ...finishingRules,
];
