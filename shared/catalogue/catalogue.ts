import { z } from "zod";

/**
 * The catalogue document: what can be chosen, what every option is in numbers, and which rules hold.
 * One immutable, versioned document; it carries no amounts of money (those are in the price list).
 * Lengths are inches with at most five decimals, weights pounds, times whole minutes.
 */

const identifier = z.string().regex(/^[a-z][A-Za-z0-9]*$/, "a camelCase word");

/** Inches (or another plain quantity) as written in the catalogue; exact to 0.00005. */
const quantity = z.number();

const severitySchema = z.enum(["stop", "caution", "note"]);
export type Severity = z.infer<typeof severitySchema>;

export const workCentreSchema = z.enum([
  "qualify",
  "firstOperation",
  "secondOperation",
  "capFitting",
  "thirdOperation",
  "finishHone",
  "wash",
  "inspection",
  "pack",
]);
export type WorkCentre = z.infer<typeof workCentreSchema>;

const minutesSchema = z.partialRecord(workCentreSchema, z.int().min(0));

/** Named quantities that figures and rules read; a later source of the same name wins (option over family). */
const valuesSchema = z.record(identifier, quantity);

export const optionSchema = z.object({
  id: identifier,
  name: z.string().min(1),
  /** One line under the name in the step form. */
  description: z.string().default(""),
  /** Families in which this option exists; absent = in all of them. */
  families: z.array(identifier).optional(),
  values: valuesSchema.default({}),
  /** Values that depend on the family, such as the case swing radius of a stroke clearance. */
  valuesByFamily: z.record(identifier, valuesSchema).default({}),
  weight: z.number().default(0),
  minutes: minutesSchema.default({}),
  leadDays: z.int().min(0).default(0),
  /** A named outline, material or other word that geometry reads, such as the rod kind. */
  words: z.record(identifier, z.string()).default({}),
  /** Numbers that are read only while this option is chosen. */
  reads: z.array(identifier).default([]),
});
export type Option = z.infer<typeof optionSchema>;

export const choiceSchema = z.object({
  id: identifier,
  name: z.string().min(1),
  question: z.string().min(1),
  /** What it is, when you want it, what it costs you. */
  help: z.object({ what: z.string(), when: z.string(), cost: z.string() }),
  options: z.array(optionSchema).min(1),
});
export type Choice = z.infer<typeof choiceSchema>;

export const numberFieldSchema = z.object({
  id: identifier,
  name: z.string().min(1),
  unit: z.enum(["in", "cc", "rpm", "hp"]),
  /** The grid the number lies on: 0.0001 in, 0.1 cc, 1 rpm, 1 hp. */
  step: z.number().positive(),
  least: z.number(),
  most: z.number(),
  /** Heading under which the step form shows it together with its neighbours of the same group. */
  group: z.string().default(""),
  hint: z.string().default(""),
  /** Only read while this option of this choice is in the build; absent = always. */
  onlyWith: z.object({ choice: identifier, option: identifier }).optional(),
});
export type NumberField = z.infer<typeof numberFieldSchema>;

export const stepSchema = z.object({
  id: z.string().regex(/^[a-z][a-z-]*$/),
  name: z.string().min(1),
  intro: z.string(),
  choices: z.array(identifier),
  numbers: z.array(identifier).default([]),
  /** The one-line caution of this step, if it needs one. */
  caution: z.string().optional(),
});
export type Step = z.infer<typeof stepSchema>;

export const familySchema = z.object({
  /** Same id as the option of the choice `family`. */
  id: identifier,
  name: z.string().min(1),
  summary: z.string(),
  /** Named lengths and counts: boreSpacing, barrelOutsideDiameter, coreShift, barrelBottom, baseBore, cylinders ... */
  values: valuesSchema,
  weight: z.number().positive(),
  minutes: minutesSchema,
  leadDays: z.int().min(0).default(0),
  /** Facts that are shown, not chosen: valley, deck thickness, blind head-bolt holes, oil gallery order ... */
  facts: z.array(z.object({ name: z.string(), value: z.string(), why: z.string().default("") })),
  /** Crate, outside, inches, and weight of crate and pallet, pounds. */
  crate: z.object({ length: z.number(), width: z.number(), height: z.number(), weight: z.number() }),
});
export type Family = z.infer<typeof familySchema>;

/** A quantity in a rule: a constant, a computed figure, a value of an option or family, or a typed number. */
export type Expression =
  | { constant: number }
  | { figure: string }
  | { value: string }
  | { number: string }
  | { sum: Expression[] }
  | { difference: [Expression, Expression] }
  | { product: [Expression, Expression] };

const expressionSchema: z.ZodType<Expression> = z
  .lazy(() =>
    z.union([
      z.strictObject({ constant: z.number() }),
      z.strictObject({ figure: identifier }),
      z.strictObject({ value: identifier }),
      z.strictObject({ number: identifier }),
      z.strictObject({ sum: z.array(expressionSchema).min(1) }),
      z.strictObject({ difference: z.tuple([expressionSchema, expressionSchema]) }),
      z.strictObject({ product: z.tuple([expressionSchema, expressionSchema]) }),
    ]),
  )
  // Named, since it contains itself and the API document must be able to point at it.
  .meta({ id: "RuleExpression" });

/** A condition over choices and quantities. A comparison that reads something unknown is undecided. */
export type Condition =
  | { choice: string; in: string[] }
  | { word: string; in: string[] }
  | { left: Expression; is: ">=" | "<=" | ">" | "<" | "="; right: Expression }
  | { all: Condition[] }
  | { any: Condition[] }
  | { not: Condition };

const conditionSchema: z.ZodType<Condition> = z
  .lazy(() =>
    z.union([
      z.strictObject({ choice: identifier, in: z.array(identifier).min(1) }),
      z.strictObject({ word: identifier, in: z.array(z.string()).min(1) }),
      z.strictObject({
        left: expressionSchema,
        is: z.enum([">=", "<=", ">", "<", "="]),
        right: expressionSchema,
      }),
      z.strictObject({ all: z.array(conditionSchema).min(1) }),
      z.strictObject({ any: z.array(conditionSchema).min(1) }),
      z.strictObject({ not: conditionSchema }),
    ]),
  )
  .meta({ id: "RuleCondition" });

const ruleBase = {
  id: z.string().regex(/^[a-z][a-z0-9-]*$/),
  /** The plain sentence a builder reads when the rule bites. */
  sentence: z.string().min(1),
  /** Why the rule exists, with its source or "common practice, no published source". */
  why: z.string().min(1),
  severity: severitySchema,
};

/** When `when` holds (absent = always), `require` must hold. */
const expressionRuleSchema = z.object({
  ...ruleBase,
  kind: z.literal("expression"),
  when: conditionSchema.optional(),
  require: conditionSchema,
});

/** Only the listed rows are allowed for these choices; a cell holds one or more option ids. */
const tableRuleSchema = z.object({
  ...ruleBase,
  kind: z.literal("table"),
  choices: z.array(identifier).min(2),
  rows: z.array(z.array(z.array(identifier).min(1))).min(1),
});

export const ruleSchema = z.discriminatedUnion("kind", [expressionRuleSchema, tableRuleSchema]);
export type Rule = z.infer<typeof ruleSchema>;

/** What a power figure is taken from: bmep range in psi by duty and induction. */
const bmepRangeSchema = z.object({
  duty: identifier,
  induction: identifier,
  low: z.number(),
  high: z.number(),
});

export const outlineSchema = z.object({
  id: identifier,
  name: z.string(),
  material: z.enum(["steel", "aluminium"]),
  /** Closed polygon of a rod for the right bank: [across, along] from the crankpin, inches. */
  points: z.array(z.tuple([z.number(), z.number()])).min(3),
});

export const catalogueSchema = z.object({
  /** Counts up by one with every published version; the spec code carries it. */
  version: z.int().min(1).max(1023),
  name: z.string().min(1),
  publishedOn: z.iso.date(),
  families: z.array(familySchema).min(1),
  steps: z.array(stepSchema).min(1),
  choices: z.array(choiceSchema).min(1),
  numbers: z.array(numberFieldSchema),
  rules: z.array(ruleSchema),
  outlines: z.array(outlineSchema).default([]),
  /** Mean effective pressures behind the power range; a pair that is not listed has no range. */
  bmepRanges: z.array(bmepRangeSchema).default([]),
});
export type Catalogue = z.infer<typeof catalogueSchema>;
