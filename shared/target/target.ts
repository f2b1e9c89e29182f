import { z } from "zod";
import { buildSchema } from "../catalogue/build.ts";

/** A displacement wished for, cu in; either end may be open. */
const displacementWishSchema = z
  .object({
    least: z.number().positive().max(2000).optional(),
    most: z.number().positive().max(2000).optional(),
  })
  .refine(({ least, most }) => least === undefined || most === undefined || least <= most, {
    message: "The least displacement is above the most.",
    path: ["least"],
  });

/** What a builder is after. All but duty and induction may be left out. */
export const targetSchema = z.object({
  /** Options of the choices `duty` and `induction`. */
  duty: z.string().max(40),
  induction: z.string().max(40),
  displacement: displacementWishSchema.optional(),
  /** Power aimed at, hp at the crank, and the engine speed held under load. */
  power: z.int().min(1).max(99_999).optional(),
  rpm: z.int().min(1).max(99_999).optional(),
  /** Most that the block may cost, cents. */
  budgetCents: z.int().min(0).max(100_000_000).optional(),
  /** Latest ship date, ISO. */
  shipBy: z.iso.date().optional(),
  /**
   * What is there already: answers that stay, and sizes measured. A size that options carry themselves, such as the stroke of a
   * crank, leaves only the options of that size and those that read it as a number.
   */
  have: buildSchema.pick({ answers: true, numbers: true }).optional(),
});
export type Target = z.infer<typeof targetSchema>;
