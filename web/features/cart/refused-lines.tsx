import { Button } from "#web/components/button.tsx";
import { ButtonLink } from "#web/components/button.tsx";
import { StateMark } from "#web/components/state-mark.tsx";
import { buildReviewLink } from "#web/lib/build-link.ts";
import type { CartView } from "#shared/contracts/cart.ts";

interface RefusedLinesProps {
  refused: CartView["refused"];
  onRemove: (id: string) => void;
}

/** Lines whose build can no longer be made as it stands: why, and the two ways on. */
export function RefusedLines({ refused, onRemove }: RefusedLinesProps) {
  if (refused.length === 0) return null;
  return (
    <section aria-labelledby="refused" className="border-2 border-stop bg-sheet p-5">
      <h2 id="refused" className="flex items-center gap-2 text-xl">
        <StateMark kind="stop" className="size-5 shrink-0" />
        {refused.length === 1
          ? "One build cannot be ordered as it stands"
          : `${refused.length} builds cannot be ordered as they stand`}
      </h2>
      <p className="mt-1 pl-7 text-iron">Open each one to mend it, or remove it; then you can check out.</p>
      <ul className="mt-3 pl-7">
        {refused.map((line) => (
          <li key={line.id} className="border-t border-rule py-3">
            <p className="numerals">{line.specCode}</p>
            <p className="max-w-text">{line.reason}</p>
            <div className="mt-2 flex flex-wrap gap-3">
              <ButtonLink to={buildReviewLink({ specCode: line.specCode, numbers: {} })}>
                Open the build
              </ButtonLink>
              <Button
                look="quiet"
                aria-label={`Remove build ${line.specCode}`}
                onClick={() => {
                  onRemove(line.id);
                }}
              >
                Remove
              </Button>
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
