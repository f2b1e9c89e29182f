import { z } from "zod";
import { targetSchema } from "../target/target.ts";

/** POST /api/targets: what a builder is after. */
export const targetRequestSchema = targetSchema;

/** What engines of the kind usually make, hp, at the engine speed; a load on the parts, never a promise. */
const powerViewSchema = z.object({
  low: z.number(),
  high: z.number(),
  rpm: z.number(),
  reached: z.boolean().nullable(),
});

const targetAnswerSchema = z.object({
  specCode: z.string(),
  numbers: z.record(z.string(), z.string()),
  /** Choices whose answers are there already. */
  mine: z.array(z.string()),
  /** "Marl, 4.125 in bore, 9.025 in deck". */
  summary: z.string(),
  answers: z.array(z.object({ step: z.string(), choice: z.string(), option: z.string() })),
  priceCents: z.int(),
  shipsOn: z.iso.date(),
  weight: z.number(),
  wall: z.number().nullable(),
  displacement: z.number().nullable(),
  power: powerViewSchema.nullable(),
  fit: z.object({ offMiddle: z.number().nullable(), cautions: z.int(), toConfirm: z.int() }),
  tradeOffs: z.array(z.string()),
});

/** The best complete builds, or which single wishes stand in the way of any. */
export const targetResultSchema = z.object({
  builds: z.array(targetAnswerSchema),
  inTheWay: z.array(z.object({ wish: z.string(), sentence: z.string() })),
});
export type TargetResult = z.infer<typeof targetResultSchema>;
