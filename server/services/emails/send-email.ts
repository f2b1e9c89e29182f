import { config } from "#server/config.ts";
import { transaction } from "#server/database/transaction.ts";
import { emailKind } from "#server/emails/kinds.ts";
import { sendMail } from "#server/gateways/mail.ts";
import { Email } from "#server/models/email.ts";
import { linkOf } from "#server/emails/links.ts";
import type { TokenPurpose } from "#server/models/access-token.ts";
import { presentShop } from "#server/presenters/shop.ts";
import { issueToken, type TokenSubject } from "#server/services/tokens/issue-token.ts";
import { shopSettings } from "#server/services/shop/shop-settings.ts";

const LONGEST_ERROR = 500;

/**
 * Sends a waiting message. Its token's hash is committed before the message leaves, so that no link is ever mailed
 * that the product does not know. A message that was sent already is left alone.
 * @throws Error when the mail server did not take it; the reason is kept with the message
 */
export async function sendEmail(emailId: string): Promise<void> {
  const prepared = await transaction(() => prepare(emailId));
  if (!prepared) return;
  const { email, link } = prepared;
  try {
    const letter = emailKind(email.kind).render({
      data: email.data,
      shop: presentShop(await shopSettings()),
      origin: config.PUBLIC_ORIGIN,
      link,
    });
    await sendMail({
      ...letter,
      messageId: email.messageId,
      to: { name: email.toName, address: email.toAddress },
    });
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    await Email.update(
      { lastError: message.slice(0, LONGEST_ERROR) },
      { where: { id: emailId, state: "waiting" } },
    );
    throw error;
  }
  await Email.update({ state: "sent", sentAt: new Date(), lastError: null }, { where: { id: emailId } });
}

async function prepare(emailId: string): Promise<{ email: Email; link: string } | null> {
  const email = await Email.findByPk(emailId, { lock: true });
  if (email?.state !== "waiting") return null;
  const { link: purpose } = emailKind(email.kind);
  await email.update({ attempts: email.attempts + 1 });
  const token = purpose === null ? undefined : await issueToken(purpose, subjectOf(email, purpose));
  return { email, link: linkOf(purpose, token) };
}

function subjectOf(email: Email, purpose: TokenPurpose): TokenSubject {
  if (purpose === "order-link" && email.orderId !== null) return { orderId: email.orderId };
  if (purpose !== "order-link" && email.personId !== null) return { personId: email.personId };
  throw new Error(`Message ${email.id} says for nobody what its link is for`);
}
