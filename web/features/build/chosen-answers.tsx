import { isRead } from "#shared/catalogue/number-fields.ts";
import { TextLink } from "#web/components/text-link.tsx";
import { stepPath } from "./build-address.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { optionName } from "./build-words.ts";

/** Everything chosen, by step, each step with the way to change it. What is not answered says so. */
export function ChosenAnswers() {
  const { current, build, search } = useBuildDesk();
  const { catalogue } = current;
  return (
    <section aria-labelledby="chosen">
      <h2 id="chosen" className="text-xl">
        Chosen
      </h2>
      <div className="mt-2 border-t-2 border-ink">
        {catalogue.steps.map((step) => (
          <div key={step.id} className="grid gap-x-4 border-b border-rule py-3 sm:grid-cols-[9rem_1fr]">
            <div className="flex items-baseline justify-between gap-x-3 sm:block">
              <h3 className="text-lg">{step.name}</h3>
              <TextLink
                to={{ pathname: stepPath(step.id), search }}
                className="inline-flex min-h-6 items-center text-sm"
              >
                Change<span className="sr-only"> {step.name}</span>
              </TextLink>
            </div>
            <dl>
              {step.choices.map((id) => {
                const choice = catalogue.choices.find((candidate) => candidate.id === id);
                const option = build.answers[id];
                return (
                  <Answer key={id} name={choice?.name ?? id}>
                    {option === undefined ? null : optionName(catalogue, id, option)}
                  </Answer>
                );
              })}
              {catalogue.numbers
                .filter((field) => step.numbers.includes(field.id) && isRead(catalogue, field, build.answers))
                .map(({ id, name, unit }) => (
                  <Answer key={id} name={name} missing="not known yet">
                    {build.numbers[id] === undefined ? null : `${build.numbers[id]} ${unit}`}
                  </Answer>
                ))}
            </dl>
          </div>
        ))}
      </div>
    </section>
  );
}

interface AnswerProps {
  name: string;
  missing?: string;
  children: string | null;
}

function Answer({ name, missing = "not answered", children }: AnswerProps) {
  return (
    <div className="flex items-baseline gap-2 py-0.5">
      <dt className="text-iron">{name}</dt>
      <span aria-hidden="true" className="min-w-4 grow border-b border-dotted border-rule" />
      <dd className={children === null ? "text-right text-iron" : "text-right font-medium"}>
        {children ?? missing}
      </dd>
    </div>
  );
}
