import type { Finding as RuleFinding } from "#shared/rules/evaluation.ts";
import { Finding } from "#web/components/finding.tsx";
import { StateMark } from "#web/components/state-mark.tsx";
import { TextLink } from "#web/components/text-link.tsx";
import { stepPath } from "./build-address.ts";
import { useBuildDesk } from "./build-desk.tsx";

/** All findings, stops first, each with its reason on demand and the way to its step. */
export function FindingsPanel({ here }: { here: string }) {
  const { current, evaluation, search } = useBuildDesk();
  const { findings } = evaluation;
  const stepName = (id: string) => current.catalogue.steps.find((step) => step.id === id)?.name ?? "its step";
  const action = ({ step }: RuleFinding) =>
    step === here ? (
      <span className="inline-flex min-h-6 items-center text-iron">this step</span>
    ) : (
      <TextLink to={{ pathname: stepPath(step), search }} className="inline-flex min-h-6 items-center">
        {stepName(step)}
      </TextLink>
    );
  return (
    <section aria-labelledby="findings">
      <h2 id="findings" className="text-xl">
        Findings
      </h2>
      {findings.length === 0 ? (
        <p className="mt-2 flex items-start gap-2 border-y border-rule py-2.5">
          <StateMark kind="pass" className="mt-1 size-4 shrink-0" />
          Nothing against the build so far.
        </p>
      ) : (
        <ul className="mt-2 border-t border-rule">
          {findings.map((finding) => (
            <Finding
              key={finding.rule}
              severity={finding.severity}
              why={finding.why}
              action={action(finding)}
            >
              {finding.sentence}
            </Finding>
          ))}
        </ul>
      )}
    </section>
  );
}
