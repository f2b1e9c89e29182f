import type { z } from "zod";
import type { TokenPurpose } from "#server/models/access-token.ts";
import type { ShopView } from "#shared/contracts/session.ts";
import { type Letter, writeLetter, type WrittenLetter } from "./letter.ts";

interface Definition<Kind extends string, Schema extends z.ZodType<object>> {
  kind: Kind;
  /** What is kept until it is sent, and after. Never a token, never a password. */
  data: Schema;
  /** The message carries a link with a token of this purpose; it is made when the message is sent. */
  link?: TokenPurpose;
  /** `link` is the finished address of the token's page, or the shop's own address for a kind without one. */
  write(with_: { data: z.output<Schema>; shop: ShopView; origin: string; link: string }): Letter;
}

export interface EmailKind<Kind extends string, Schema extends z.ZodType<object>> {
  kind: Kind;
  data: Schema;
  link: TokenPurpose | null;
  /** @throws ZodError when the data do not fit the kind */
  render(with_: { data: unknown; shop: ShopView; origin: string; link: string }): WrittenLetter;
}

/** Defines a kind of message. It is known to the product as soon as it stands in kinds.ts. */
export function defineEmail<Kind extends string, Schema extends z.ZodType<object>>(
  definition: Definition<Kind, Schema>,
): EmailKind<Kind, Schema> {
  return {
    kind: definition.kind,
    data: definition.data,
    link: definition.link ?? null,
    render: ({ data, ...rest }) =>
      writeLetter(definition.write({ ...rest, data: definition.data.parse(data) }), rest.shop),
  };
}
