import { AccessToken, type TokenPurpose } from "#server/models/access-token.ts";
import { hashToken } from "./issue-token.ts";

/**
 * The access that a token of this purpose gives; null when there is none such, or it was used, revoked or has run out.
 * Within a transaction the row is locked, so that a token that is used once is used once.
 */
export async function findToken(purpose: TokenPurpose, token: string): Promise<AccessToken | null> {
  const found = await AccessToken.findOne({ where: { purpose, tokenHash: hashToken(token) }, lock: true });
  if (!found || found.usedAt !== null || found.revokedAt !== null) return null;
  if (found.expiresAt !== null && found.expiresAt.getTime() <= Date.now()) return null;
  return found;
}
