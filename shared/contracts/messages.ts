import { z } from "zod";

const messageStateSchema = z.enum(["waiting", "sent"]);

const messageSummarySchema = z.object({
  id: z.uuid(),
  kind: z.string(),
  to: z.string(),
  subject: z.string(),
  state: messageStateSchema,
  createdAt: z.iso.datetime(),
  sentAt: z.iso.datetime().nullable(),
  attempts: z.int(),
  lastError: z.string().nullable(),
  orderNumber: z.string().nullable(),
});
export type MessageSummary = z.infer<typeof messageSummarySchema>;

/** GET /api/messages?state=&search=&page= */
export const messageListQuerySchema = z.object({
  state: messageStateSchema.optional(),
  search: z.string().trim().max(100).default(""),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
});
export type MessageListQuery = z.infer<typeof messageListQuerySchema>;

export const messageListSchema = z.object({
  messages: z.array(messageSummarySchema),
  total: z.int(),
  page: z.int(),
  pages: z.int(),
});

/** GET /api/messages/:id: the text as sent, its links masked. */
export const messageSchema = messageSummarySchema.extend({ text: z.string() });
export type MessageView = z.infer<typeof messageSchema>;
