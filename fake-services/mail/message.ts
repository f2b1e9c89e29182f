import { z } from "zod";

/** A message as the mailbox keeps it: one for each Message-ID, however often it was sent. */
export const messageSchema = z.object({
  id: z.string(),
  messageId: z.string(),
  from: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  text: z.string(),
  html: z.string().nullable(),
  /** Header lines by lower-case name. */
  headers: z.record(z.string(), z.string()),
  receivedAt: z.iso.datetime(),
  /** How many times this Message-ID came in. */
  copies: z.int().positive(),
});
export type StoredMessage = z.infer<typeof messageSchema>;

/**
 * accept: takes the message. refuse: answers 451, so that the sender tries again later.
 * drop-after-data: takes the message, then cuts the connection before the answer.
 */
export const controlSchema = z.object({
  mode: z.enum(["accept", "refuse", "drop-after-data"]),
  /** After so many messages it is back to accept; for good when left out. */
  times: z.int().positive().optional(),
});
export type Control = z.infer<typeof controlSchema>;
export type ControlMode = Control["mode"];
