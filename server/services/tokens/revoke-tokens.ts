import { AccessToken, type TokenPurpose } from "#server/models/access-token.ts";
import type { TokenSubject } from "./issue-token.ts";

/** Ends every link of this purpose that is still good. */
export async function revokeTokens(purpose: TokenPurpose, subject: TokenSubject): Promise<void> {
  await AccessToken.update(
    { revokedAt: new Date() },
    { where: { purpose, ...subject, usedAt: null, revokedAt: null } },
  );
}
