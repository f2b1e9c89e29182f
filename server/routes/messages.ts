import { z } from "zod";
import { readMessages, sendMessages } from "#server/policies/common.ts";
import { presentMessage, presentMessageSummary } from "#server/presenters/message.ts";
import { presentShop } from "#server/presenters/shop.ts";
import { sendAgain } from "#server/services/emails/send-again.ts";
import { listMessages } from "#server/services/messages/list-messages.ts";
import { readMessage } from "#server/services/messages/read-message.ts";
import { shopSettings } from "#server/services/shop/shop-settings.ts";
import { messageListQuerySchema, messageListSchema, messageSchema } from "#shared/contracts/messages.ts";
import { defineRoute } from "./define-route.ts";

const params = z.object({ id: z.uuid() });

export const messageRoutes = [
  defineRoute({
    method: "get",
    path: "/api/messages",
    summary: "Sent and waiting e-mails, newest first",
    access: readMessages,
    query: messageListQuerySchema,
    response: messageListSchema,
    handle: async ({ query }) => {
      const { records, total, pages } = await listMessages(query);
      const shop = presentShop(await shopSettings());
      return {
        messages: records.map((record) => presentMessageSummary(record, shop)),
        total,
        pages,
        page: query.page,
      };
    },
  }),
  defineRoute({
    method: "get",
    path: "/api/messages/:id",
    summary: "One e-mail as it reads, its link masked",
    access: readMessages,
    params,
    response: messageSchema,
    problems: ["not-found"],
    handle: async ({ params: { id } }) =>
      presentMessage(await readMessage(id), presentShop(await shopSettings())),
  }),
  defineRoute({
    method: "post",
    path: "/api/messages/:id/send-again",
    summary: "Send an e-mail once more, with a new link where it has one",
    access: sendMessages,
    params,
    response: messageSchema,
    status: 202,
    problems: ["not-found"],
    handle: async ({ params: { id } }) => {
      await sendAgain(id);
      return presentMessage(await readMessage(id), presentShop(await shopSettings()));
    },
  }),
];
