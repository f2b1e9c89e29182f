import { useMemo, useState, type KeyboardEvent } from "react";
import type { Choice } from "#shared/catalogue/catalogue.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import { explain } from "#shared/rules/explain.ts";
import type { ChoiceState, OptionState } from "#shared/rules/evaluation.ts";
import { useAnnounce } from "#web/components/announcer.tsx";
import { classNames } from "#web/components/class-names.ts";
import { StateMark } from "#web/components/state-mark.tsx";
import { useBuildDesk, type BuildDesk } from "./build-desk.tsx";
import { effectParts, inSentence } from "./build-words.ts";
import { ChoiceHelp } from "./choice-help.tsx";
import { ClosedReason, MendButton } from "./closed-option.tsx";
import { optionEffects } from "./option-effects.ts";
import { SizeEntry } from "./size-entry.tsx";

interface SizeChartProps {
  choice: Choice;
  state: ChoiceState;
}

const arrows: Partial<Record<string, 1 | -1>> = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 };

/**
 * A choice with many sizes, as a chart: a radio for each size in rows of small cells, a box to type one into, and under it
 * what the size in question changes or why it is closed. Digits typed on the chart go to the size that begins so.
 */
export function SizeChart({ choice, state }: SizeChartProps) {
  const desk = useBuildDesk();
  const { choose } = desk;
  const announce = useAnnounce();
  const [looked, setLooked] = useState<string | null>(null);
  const [typed, setTyped] = useState("");
  const made = useMadeInFamily(desk, choice.id);
  const shown = state.options.filter((option) => option.chosen || made === null || made.has(option.option));
  const elsewhere = state.options.length - shown.length;
  const closedCount = shown.filter((option) => !option.open).length;
  const names = new Map(choice.options.map(({ id, name }) => [id, name]));
  const chosen = state.options.find((option) => option.chosen);
  const inQuestion = state.options.find(({ option }) => option === looked) ?? chosen;

  const reach = (target: OptionState | undefined, lookOnly = false) => {
    if (target === undefined) return;
    setLooked(target.option);
    document.getElementById(`${choice.id}-${target.option}`)?.focus();
    if (target.open && !target.chosen && !lookOnly) choose(choice.id, target.option);
  };
  const press = (event: KeyboardEvent, from: number) => {
    const by = arrows[event.key];
    if (by !== undefined) {
      event.preventDefault();
      reach(shown[(from + by + shown.length) % shown.length]);
    } else if (event.key === "Home" || event.key === "End") {
      event.preventDefault();
      reach(shown.at(event.key === "Home" ? 0 : -1));
    } else if (/^[\d.]$/.test(event.key) && !event.ctrlKey && !event.metaKey && !event.altKey) {
      const digits = typed + event.key;
      const found = shown.find(({ option }) => names.get(option)?.startsWith(digits));
      setTyped(found === undefined ? event.key : digits);
      // Several digits make one size: it is looked at, and chosen by the space bar.
      if (found !== undefined) reach(found, true);
    }
  };

  return (
    <fieldset aria-describedby={`${choice.id}-hint`}>
      <legend className="font-condensed text-xl font-semibold">{choice.question}</legend>
      <div id={`${choice.id}-hint`} className="mt-1 max-w-text text-iron">
        <ChoiceHelp choice={choice} single={shown.length === 1} />
      </div>
      <SizeEntry
        name={choice.id}
        label={`Type a ${inSentence(choice.name)}`}
        sizes={state.options.map(({ option }) => ({ id: option, name: names.get(option) ?? option }))}
        range={shown.map(({ option }) => names.get(option) ?? option)}
        onPick={(option) => {
          const picked = state.options.find((candidate) => candidate.option === option);
          reach(picked);
          if (picked?.open === false) {
            const { sentence } = explain(desk.current, desk.build, { choice: choice.id, option });
            announce(`${names.get(option) ?? option} is closed. ${sentence}`);
          }
        }}
      />
      <div className="mt-3 grid grid-cols-[repeat(auto-fill,minmax(4.25rem,1fr))] border-t border-l border-rule">
        {shown.map((option, index) => (
          <SizeCell
            key={option.option}
            name={choice.id}
            label={names.get(option.option) ?? option.option}
            state={option}
            effects={optionEffects(desk.current, choice.id, option)}
            detail={option === inQuestion ? `${choice.id}-detail` : null}
            onLook={() => {
              setLooked(option.option);
            }}
            onChoose={() => {
              setLooked(option.option);
              setTyped("");
              choose(choice.id, option.option);
            }}
            onKey={(event) => {
              press(event, index);
            }}
          />
        ))}
      </div>
      <div id={`${choice.id}-detail`} className="min-h-32 border-b border-rule py-3 sm:min-h-24">
        {inQuestion === undefined ? (
          <p className="text-iron">Nothing chosen yet. Each size shows here what it changes.</p>
        ) : (
          <SizeDetail choice={choice} state={inQuestion} desk={desk} />
        )}
      </div>
      <p className="mt-2 text-sm text-iron">
        {closedCount > 0 &&
          `${closedCount} of ${shown.length} sizes are closed with the build as it stands. `}
        {elsewhere > 0 && `${elsewhere} more sizes belong to other families; type one to see which.`}
      </p>
    </fieldset>
  );
}

/** Options that are open with nothing but the family answered; null without a family. */
function useMadeInFamily({ current, build }: BuildDesk, choice: string): Set<string> | null {
  const family = build.answers["family"];
  return useMemo(() => {
    if (family === undefined) return null;
    const bare = evaluate(current, { answers: { family }, numbers: {}, mine: [] });
    const options = bare.choices.find((candidate) => candidate.choice === choice)?.options ?? [];
    return new Set(options.filter(({ open }) => open).map(({ option }) => option));
  }, [current, family, choice]);
}

interface SizeCellProps {
  name: string;
  label: string;
  state: OptionState;
  effects: string[];
  /** Id of what is said of it under the chart, while it is. */
  detail: string | null;
  onLook: () => void;
  onChoose: () => void;
  onKey: (event: KeyboardEvent) => void;
}

function SizeCell({ name, label, state, effects, detail, onLook, onChoose, onKey }: SizeCellProps) {
  const id = `${name}-${state.option}`;
  const price = state.chosen ? [] : effectParts({ ...state.effect, days: null, weight: null });
  return (
    <label
      htmlFor={id}
      onPointerEnter={(event) => {
        if (event.pointerType === "mouse") onLook();
      }}
      className={classNames(
        "relative flex min-h-target flex-col items-center justify-center border-r border-b border-rule px-1 text-lg leading-tight numerals",
        "has-focus-visible:z-10 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-dye",
        state.chosen && "bg-dye text-on-dye",
        !state.open && "cursor-not-allowed",
        !state.open && !state.chosen && "bg-wash text-iron line-through",
        state.open && !state.chosen && "hover:bg-wash",
      )}
    >
      <input
        type="radio"
        id={id}
        name={name}
        value={state.option}
        checked={state.chosen}
        aria-disabled={!state.open}
        aria-describedby={detail ?? `${id}-effects`}
        onFocus={onLook}
        onChange={() => {
          if (state.open) onChoose();
        }}
        onClick={(event) => {
          onLook();
          if (!state.open) event.preventDefault();
        }}
        onKeyDown={onKey}
        className="absolute inset-0 cursor-[inherit] opacity-0"
      />
      {label.replace(/ in$/, "")}
      {price.map((part) => (
        <span key={part} className="text-xs">
          {part}
        </span>
      ))}
      <span id={`${id}-effects`} className="sr-only">
        {state.open ? effects.join(", ") : "Closed. The reason stands under the chart."}
      </span>
    </label>
  );
}

interface SizeDetailProps {
  choice: Choice;
  state: OptionState;
  desk: BuildDesk;
}

function SizeDetail({ choice, state, desk }: SizeDetailProps) {
  const option = choice.options.find(({ id }) => id === state.option);
  const wanted = { choice: choice.id, option: state.option };
  return (
    <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1">
      <p className="grow basis-64">
        <span className="text-lg numerals">{option?.name}</span>{" "}
        <span className="text-sm text-iron">{option?.description}</span>
      </p>
      {state.open ? (
        <p className="text-sm numerals text-iron">
          {optionEffects(desk.current, choice.id, state).join(" · ")}
        </p>
      ) : (
        <div className="flex basis-full flex-wrap items-center gap-x-4 gap-y-1">
          <p className="flex grow basis-64 items-start gap-2 text-sm">
            <StateMark kind="stop" className="mt-0.5 size-4 shrink-0" />
            <span>
              <span className="font-semibold text-stop">Closed.</span> <ClosedReason {...wanted} />
            </span>
          </p>
          <MendButton {...wanted} />
        </div>
      )}
    </div>
  );
}
