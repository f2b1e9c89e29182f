import type { Choice } from "#shared/catalogue/catalogue.ts";

interface ChoiceHelpProps {
  choice: Choice;
  /** The choice has one option in the family. */
  single: boolean;
}

/** What it is in one line; when one wants it and what it costs, on demand. */
export function ChoiceHelp({ choice, single }: ChoiceHelpProps) {
  const { what, when, cost } = choice.help;
  return (
    <>
      <p>{single ? `One option in this family. ${what}` : what}</p>
      <details className="text-sm">
        <summary className="inline-flex min-h-6 cursor-pointer items-center text-dye underline underline-offset-4">
          When you want it, what it costs you
        </summary>
        <p className="mt-1">{when}</p>
        <p className="mt-1">{cost}</p>
      </details>
    </>
  );
}
