import { config } from "#server/config.ts";
import type { TokenPurpose } from "#server/models/access-token.ts";

/** Where a mailed token leads. The first two pages act by a button only; the last sets a cookie and goes on. */
const pages: Record<TokenPurpose, (token: string) => string> = {
  "verify-email": (token) => `/account/verify?token=${token}`,
  "reset-password": (token) => `/account/reset?token=${token}`,
  "order-link": (token) => `/order-link/${token}`,
};

/** The address of a token's page; without a token, the masked one that the Office sees. */
export function linkOf(purpose: TokenPurpose | null, token = "…"): string {
  return purpose === null ? config.PUBLIC_ORIGIN : `${config.PUBLIC_ORIGIN}${pages[purpose](token)}`;
}
