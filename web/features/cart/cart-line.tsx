import { Button } from "#web/components/button.tsx";
import { Notice } from "#web/components/notice.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { TitleBlock } from "#web/components/title-block.tsx";
import { buildReviewLink } from "#web/lib/build-link.ts";
import { date, money, pounds } from "#web/lib/format.ts";
import type { CartLineView } from "#shared/contracts/cart.ts";
import { QuantityStepper } from "./quantity-stepper.tsx";

const mostBlocks = 20;

interface CartLineProps {
  line: CartLineView;
  /** Asked for and not yet answered. */
  quantity: number;
  onQuantity: (quantity: number) => void;
  onRemove: () => void;
}

/** One build in the cart under its title block. */
export function CartLine({ line, quantity, onQuantity, onRemove }: CartLineProps) {
  const { build } = line;
  const link = buildReviewLink(build, line.engraving);
  const cautions = build.findings.filter((finding) => finding.severity === "caution").length;
  return (
    <li className="space-y-4">
      <TitleBlock
        label={build.summary}
        cells={[
          { label: "Block", value: build.summary, wide: true },
          { label: "Spec code", value: <TextLink to={link}>{build.specCode}</TextLink>, wide: true },
          { label: "Weight, one block", value: pounds(build.weight) },
          { label: "Ships, estimate", value: date(build.shipsOn) },
          { label: "Price, one block", value: money(build.priceCents) },
        ]}
      />
      {line.earlierPriceCents !== null && (
        <Notice kind="caution" title="The price changed since this was put in the cart">
          It was {money(line.earlierPriceCents)} for one block; today it is {money(build.priceCents)}.
        </Notice>
      )}
      {cautions > 0 && (
        <p>
          <TextLink to={link}>
            {cautions === 1 ? "One caution stands" : `${cautions} cautions stand`} with this build
          </TextLink>
        </p>
      )}
      <OwnWords line={line} />
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="flex flex-wrap items-center gap-4">
          <QuantityStepper
            id={`quantity-${line.id}`}
            label={`Blocks of ${build.summary}`}
            quantity={quantity}
            most={mostBlocks}
            onChange={onQuantity}
          />
          <Button look="quiet" onClick={onRemove} aria-label={`Remove ${build.summary}`}>
            Remove
          </Button>
        </div>
        <p className="ml-auto text-right">
          <span className="cell-label block">
            {line.quantity === 1 ? "One block" : `${line.quantity} blocks at ${money(build.priceCents)}`}
          </span>
          <span className="text-xl numerals">{money(line.totalCents)}</span>
        </p>
      </div>
    </li>
  );
}

/** What the buyer asked to be cut into the iron, and what the shop is asked. */
function OwnWords({ line }: { line: CartLineView }) {
  if (line.engraving === "" && line.specialRequest === "") return null;
  return (
    <dl className="space-y-2">
      {line.engraving !== "" && (
        <div className="flex flex-wrap items-baseline gap-x-3">
          <dt className="cell-label">Engraving</dt>
          <dd className="text-lg tracking-widest numerals">{line.engraving}</dd>
        </div>
      )}
      {line.specialRequest !== "" && (
        <div>
          <dt className="cell-label">
            Special request, answered by the planner before the order is accepted
          </dt>
          <dd className="max-w-text whitespace-pre-line break-words">{line.specialRequest}</dd>
        </div>
      )}
    </dl>
  );
}
