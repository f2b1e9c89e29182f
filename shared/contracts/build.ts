import { z } from "zod";
import { workCentreSchema } from "../catalogue/catalogue.ts";

/** Twelve characters that can be cut into iron: capitals, digits, blank, dot and hyphen. */
export const engravingSchema = z
  .string()
  .trim()
  .max(12, "At most 12 characters.")
  .regex(/^[A-Z0-9 .-]*$/, "Capitals, digits, blank, dot and hyphen only.");

/** A build as it travels: the spec code and what stands beside it. */
export const buildRequestSchema = z.object({
  specCode: z.string().min(4).max(120),
  numbers: z.record(z.string().max(40), z.string().max(20)).default({}),
});
export type BuildRequest = z.infer<typeof buildRequestSchema>;

const priceLineSchema = z.object({
  kind: z.enum(["base", "option"]),
  label: z.string(),
  amountCents: z.int(),
});

const findingViewSchema = z.object({
  rule: z.string(),
  severity: z.enum(["stop", "caution", "note"]),
  sentence: z.string(),
  undecided: z.boolean(),
});

const figureViewSchema = z.object({
  id: z.string(),
  name: z.string(),
  unit: z.string(),
  value: z.number().nullable(),
  places: z.int(),
});

/** What the server says of a build: POST /api/builds, and within carts and orders. */
export const buildViewSchema = z.object({
  specCode: z.string(),
  catalogueVersion: z.int(),
  priceListVersion: z.int(),
  family: z.string(),
  /** "Marl, 4.1250 in bore, 9.0250 in deck", for lists and mails. */
  summary: z.string(),
  answers: z.array(z.object({ step: z.string(), choice: z.string(), option: z.string() })),
  numbers: z.record(z.string(), z.string()),
  figures: z.array(figureViewSchema),
  findings: z.array(findingViewSchema),
  priceLines: z.array(priceLineSchema),
  priceCents: z.int(),
  weight: z.number(),
  /** Minutes of one block at each work centre. */
  minutes: z.partialRecord(workCentreSchema, z.int().min(0)),
  leadDays: z.int().min(0),
  shipsOn: z.iso.date(),
});
export type BuildView = z.infer<typeof buildViewSchema>;

/** POST /api/builds/mend: a closed option to let in, or, without one, a whole build to repair. */
export const mendRequestSchema = buildRequestSchema.extend({
  /** Choices whose answers stay. */
  mine: z.array(z.string().max(40)).max(100).default([]),
  wanted: z.object({ choice: z.string().max(40), option: z.string().max(40) }).optional(),
});
export type MendRequest = z.infer<typeof mendRequestSchema>;

/** Both null: the option is open, or nothing is to be repaired. A reason without a mend: nothing helps. */
export const mendResultSchema = z.object({
  reason: z
    .object({
      sentence: z.string(),
      answers: z.array(z.object({ choice: z.string(), option: z.string() })),
      numbers: z.array(z.string()),
      rules: z.array(z.string()),
    })
    .nullable(),
  mend: z
    .object({
      /** Option ids; `to` is null where the answer is dropped. */
      changes: z.array(z.object({ choice: z.string(), from: z.string(), to: z.string().nullable() })),
      priceCents: z.int().nullable(),
      days: z.int().nullable(),
    })
    .nullable(),
});
export type MendResult = z.infer<typeof mendResultSchema>;
