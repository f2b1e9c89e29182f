import { z } from "zod";

/**
 * A build: the answers given so far (choice id -> option id), the numbers typed (number id -> exact decimal as
 * text, e.g. "6.1250"; absent = unknown) and the choices the builder marks as fixed ("mine").
 */
export const buildSchema = z.object({
  answers: z.record(z.string().max(40), z.string().max(40)),
  numbers: z.record(
    z.string().max(40),
    z.string().regex(/^-?\d{1,6}(\.\d{1,4})?$/, "a plain decimal number"),
  ),
  mine: z.array(z.string().max(40)),
});
export type Build = z.infer<typeof buildSchema>;

/** A build with nothing answered. */
export const emptyBuild: Build = { answers: {}, numbers: {}, mine: [] };
