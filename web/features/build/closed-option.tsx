import { useDeferredValue, useMemo } from "react";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import type { Evaluation } from "#shared/rules/evaluation.ts";
import { explain, type Wanted } from "#shared/rules/explain.ts";
import { mend } from "#shared/rules/mend.ts";
import { Button } from "#web/components/button.tsx";
import { useBuildDesk } from "./build-desk.tsx";
import { mendWords } from "./build-words.ts";

/*
 * Reasons and mends cost more than the evaluation itself, so they are worked out after the click is on the screen,
 * one closed option at a time, and only for what is shown.
 */

interface Settled {
  context: CurrentCatalogue;
  evaluation: Evaluation;
}

/** The build as it stood when there was last time to think about it; null at first. */
function useSettled(choice: string): Settled | null {
  const { current, evaluationFor } = useBuildDesk();
  const now = useMemo(
    () => ({ context: current, evaluation: evaluationFor(choice) }),
    [current, evaluationFor, choice],
  );
  return useDeferredValue(now, null);
}

function isClosed({ evaluation }: Settled, { choice, option }: Wanted): boolean {
  const state = evaluation.choices.find((candidate) => candidate.choice === choice);
  return state?.options.find((candidate) => candidate.option === option)?.open === false;
}

/** One line: what stands against a closed option. */
export function ClosedReason({ choice, option }: Wanted) {
  const settled = useSettled(choice);
  const sentence = useMemo(() => {
    if (settled === null || !isClosed(settled, { choice, option })) return null;
    return explain(settled.context, settled.evaluation.build, { choice, option }).sentence;
  }, [settled, choice, option]);
  return sentence ?? "\u00a0";
}

/** The button that lets a closed option in and changes what stands against it; nothing where no mend exists. */
export function MendButton({ choice, option, lead }: Wanted & { lead?: string }) {
  const { current, chooseWithMend } = useBuildDesk();
  const settled = useSettled(choice);
  const found = useMemo(
    () =>
      settled === null || !isClosed(settled, { choice, option })
        ? null
        : mend(settled.context, settled.evaluation.build, { choice, option }),
    [settled, choice, option],
  );
  if (settled === null) return <span className="block min-h-target" />;
  if (found === null) return null;
  return (
    <MendOffer
      words={mendWords(current.catalogue, found, lead)}
      onTake={() => {
        chooseWithMend({ choice, option }, found);
      }}
    />
  );
}

interface MendOfferProps {
  words: string;
  onTake: () => void;
}

export function MendOffer({ words, onTake }: MendOfferProps) {
  return (
    <Button onClick={onTake} className="text-left text-sm">
      {words}
    </Button>
  );
}
