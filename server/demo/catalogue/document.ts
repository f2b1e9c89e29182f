import type { z } from "zod";
import type {
  choiceSchema,
  familySchema,
  numberFieldSchema,
  optionSchema,
  outlineSchema,
  ruleSchema,
  stepSchema,
} from "#shared/catalogue/catalogue.ts";

/** Parts of the catalogue document as they are written, before their defaults are filled in. */
export type FamilyDocument = z.input<typeof familySchema>;
export type OptionDocument = z.input<typeof optionSchema>;
export type ChoiceDocument = z.input<typeof choiceSchema>;
export type StepDocument = z.input<typeof stepSchema>;
export type NumberDocument = z.input<typeof numberFieldSchema>;
export type RuleDocument = z.input<typeof ruleSchema>;
export type OutlineDocument = z.input<typeof outlineSchema>;
