import { createHash, randomBytes } from "node:crypto";
import { AccessToken, type TokenPurpose } from "#server/models/access-token.ts";

export type TokenSubject = { personId: string } | { orderId: string };

const MINUTE = 60_000;
/** How long a link may be used, from the moment its message is sent; null = until something else ends it. */
const lifetimes: Record<TokenPurpose, number | null> = {
  "verify-email": 24 * 60 * MINUTE,
  "reset-password": 30 * MINUTE,
  "order-link": null,
};

export const hashToken = (token: string): string => createHash("sha256").update(token).digest("hex");

/** Makes a 256-bit random token and keeps its hash; the token itself is told once, here. */
export async function issueToken(purpose: TokenPurpose, subject: TokenSubject): Promise<string> {
  const token = randomBytes(32).toString("base64url");
  const lifetime = lifetimes[purpose];
  await AccessToken.create({
    purpose,
    tokenHash: hashToken(token),
    expiresAt: lifetime === null ? null : new Date(Date.now() + lifetime),
    ...subject,
  });
  return token;
}
