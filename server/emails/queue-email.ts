import { randomUUID } from "node:crypto";
import { transaction } from "#server/database/transaction.ts";
import { enqueue } from "#server/jobs/queue.ts";
import { Email } from "#server/models/email.ts";
import { newMessageId } from "./message-id.ts";
import { type EmailData, type EmailKindName, emailKinds } from "./kinds.ts";

export interface EmailRequest<Kind extends EmailKindName> {
  kind: Kind;
  to: { name: string; address: string };
  data: EmailData<Kind>;
  /** Whom or what its link is for, and where the Office finds it. */
  personId?: string;
  orderId?: string;
  /** Names the event, as "order-placed:<id>". A second message with the same key is not written. */
  eventKey: string;
}

/**
 * Writes a message down and queues its sending, within the running transaction: it goes out exactly when that commits.
 * @throws ZodError when the data do not fit the kind
 */
export async function queueEmail<Kind extends EmailKindName>(request: EmailRequest<Kind>): Promise<void> {
  const data = emailKinds[request.kind].data.parse(request.data);
  await transaction(async () => {
    const id = randomUUID();
    const written = await Email.bulkCreate(
      [
        {
          id,
          kind: request.kind,
          toAddress: request.to.address,
          toName: request.to.name,
          data,
          personId: request.personId ?? null,
          orderId: request.orderId ?? null,
          messageId: newMessageId(),
          eventKey: request.eventKey,
        },
      ],
      { ignoreDuplicates: true },
    );
    if (written.length > 0 && (await Email.count({ where: { id } })) === 1)
      await enqueue("send-email", { emailId: id });
  });
}
