import type { ReactNode } from "react";
import { TextLink } from "#web/components/text-link.tsx";
import { buildReviewLink } from "#web/lib/build-link.ts";
import { money } from "#web/lib/format.ts";
import type { OrderLineView } from "#shared/contracts/orders.ts";
import { BuildFacts } from "./build-facts.tsx";

interface OrderLineProps {
  line: OrderLineView;
  /** Stands under the special request in place of its answer; for whoever has to give it. */
  answer?: ReactNode;
  /** Folds what is behind the build away, where several lines stand one under the other. */
  folded?: boolean;
}

/** One line of an order: the build, what was asked for besides, and everything behind it. */
export function OrderLine({ line, answer, folded = false }: OrderLineProps) {
  const { build } = line;
  return (
    <li className="border-t-2 border-ink pt-4">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
        <h3 className="text-xl">
          {line.quantity > 1 && <span className="text-iron">{line.quantity} × </span>}
          {build.summary}
        </h3>
        <p className="text-xl numerals">{money(line.totalCents)}</p>
      </div>
      <p className="numerals">
        <TextLink to={buildReviewLink(build, line.engraving)}>{build.specCode}</TextLink>
        {line.quantity > 1 && <span className="text-iron"> {money(build.priceCents)} for one block</span>}
      </p>
      <dl className="mt-3 space-y-3 empty:hidden">
        {line.engraving !== "" && (
          <div className="flex flex-wrap items-baseline gap-x-3">
            <dt className="cell-label">Engraving</dt>
            <dd className="text-lg tracking-widest numerals">{line.engraving}</dd>
          </div>
        )}
        {line.specialRequest !== "" && (
          <div>
            <dt className="cell-label">Special request</dt>
            <dd className="max-w-text border-l-3 border-dye pl-3 whitespace-pre-line break-words">
              {line.specialRequest}
            </dd>
          </div>
        )}
        {line.specialRequestAnswer !== "" && (
          <div>
            <dt className="cell-label">The shop's answer</dt>
            <dd className="max-w-text border-l-3 border-ink pl-3 whitespace-pre-line break-words">
              {line.specialRequestAnswer}
            </dd>
          </div>
        )}
      </dl>
      {answer !== undefined && <div className="mt-3 max-w-form">{answer}</div>}
      {folded ? (
        <details className="mt-3">
          <summary className="inline-flex min-h-target cursor-pointer items-center text-dye underline underline-offset-4 in-data-[place=floor]:min-h-target-floor">
            {foldName(build)}
          </summary>
          <div className="mt-3">
            <BuildFacts build={build} />
          </div>
        </details>
      ) : (
        <div className="mt-5">
          <BuildFacts build={build} />
        </div>
      )}
    </li>
  );
}

function foldName(build: OrderLineView["build"]): string {
  const cautions = build.findings.filter((finding) => finding.severity !== "note").length;
  if (cautions === 0) return "Choices, figures and notes";
  return cautions === 1 ? "Choices, figures and one caution" : `Choices, figures and ${cautions} cautions`;
}
