import type { ReactNode } from "react";
import { FigureList } from "#web/components/figure-list.tsx";
import { Finding } from "#web/components/finding.tsx";
import { Quantity } from "#web/components/quantity.tsx";
import { fixed } from "#web/lib/format.ts";
import type { BuildView } from "#shared/contracts/build.ts";

/** What was chosen, the figures that follow from it, and what the rules say: side by side where there is room. */
export function BuildFacts({ build }: { build: BuildView }) {
  // What reads a number that was never given says nothing about the block that was ordered.
  const known = build.figures.flatMap(({ value, ...figure }) =>
    value === null ? [] : [{ ...figure, value }],
  );
  return (
    <div className="grid gap-x-10 gap-y-6 md:grid-cols-2">
      <Part title="Chosen">
        <Choices build={build} />
      </Part>
      <div className="space-y-6">
        {build.findings.length > 0 && (
          <Part title="To bear in mind">
            <ul className="border-t border-rule">
              {build.findings.map((finding) => (
                <Finding key={finding.rule} severity={finding.severity}>
                  {finding.sentence}
                </Finding>
              ))}
            </ul>
          </Part>
        )}
        <Part title="Figures">
          <FigureList
            figures={known.map((figure) => ({
              id: figure.id,
              name: figure.name,
              value: (
                <Quantity
                  value={fixed(figure.value, figure.places)}
                  {...(figure.unit === "ratio" ? {} : { unit: figure.unit })}
                />
              ),
            }))}
          />
        </Part>
      </div>
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h4 className="mb-1 text-lg">{title}</h4>
      {children}
    </section>
  );
}

function Choices({ build }: { build: BuildView }) {
  const steps = [...new Set(build.answers.map((answer) => answer.step))];
  return (
    <div className="space-y-3">
      {steps.map((step) => (
        <div key={step}>
          <h5 className="cell-label">{step}</h5>
          <dl className="border-t border-rule">
            {build.answers
              .filter((answer) => answer.step === step)
              .map((answer) => (
                <div
                  key={answer.choice}
                  className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-rule py-1.5"
                >
                  <dt className="text-iron">{answer.choice}</dt>
                  <dd className="font-medium">{answer.option}</dd>
                </div>
              ))}
          </dl>
        </div>
      ))}
    </div>
  );
}
