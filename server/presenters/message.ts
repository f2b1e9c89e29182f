import { config } from "#server/config.ts";
import { emailKind } from "#server/emails/kinds.ts";
import { linkOf } from "#server/emails/links.ts";
import type { WrittenLetter } from "#server/emails/letter.ts";
import type { MessageRecord } from "#server/services/messages/list-messages.ts";
import type { MessageSummary, MessageView } from "#shared/contracts/messages.ts";
import type { ShopView } from "#shared/contracts/session.ts";

/** The message as it reads, its link masked: tokens are not kept and not shown. */
function written({ email }: MessageRecord, shop: ShopView): WrittenLetter {
  const kind = emailKind(email.kind);
  return kind.render({ data: email.data, shop, origin: config.PUBLIC_ORIGIN, link: linkOf(kind.link) });
}

export function presentMessageSummary(record: MessageRecord, shop: ShopView): MessageSummary {
  const { email } = record;
  return {
    id: email.id,
    kind: email.kind,
    to: `${email.toName} <${email.toAddress}>`,
    subject: written(record, shop).subject,
    state: email.state,
    createdAt: email.createdAt.toISOString(),
    sentAt: email.sentAt?.toISOString() ?? null,
    attempts: email.attempts,
    lastError: email.lastError,
    orderNumber: record.orderNumber,
  };
}

export function presentMessage(record: MessageRecord, shop: ShopView): MessageView {
  return { ...presentMessageSummary(record, shop), text: written(record, shop).text };
}
