import type { KeyboardEvent, ReactNode } from "react";
import { FieldError } from "./field.tsx";
import { StateMark } from "./state-mark.tsx";
import { classNames } from "./class-names.ts";

export interface OptionRow {
  value: string;
  name: ReactNode;
  /** One line under the name. */
  description?: ReactNode;
  /** What choosing it changes, at the right: price, weight, days. */
  effects?: ReactNode;
  /** Set when the option is closed: one line of reason, and the button that mends it. */
  closed?: { reason: ReactNode; mend?: ReactNode } | undefined;
}

interface OptionListProps {
  /** The question; the legend of the fieldset. */
  legend: ReactNode;
  /** Help under the question. */
  hint?: ReactNode;
  /** Name of the radios and stem of their ids: `${name}-${value}`. */
  name: string;
  options: OptionRow[];
  value: string | null;
  onChoose: (value: string) => void;
  error?: string | undefined;
  /** Said when just one option is open. */
  oneOpenNotice?: ReactNode;
}

const arrows: Partial<Record<string, 1 | -1>> = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 };

/**
 * The options of one choice, as radios in a fieldset. A closed option stays where it is and takes focus
 * (aria-disabled, its reason by aria-describedby) but cannot be chosen; the arrows go over it without choosing it.
 */
export function OptionList({
  legend,
  hint,
  name,
  options,
  value,
  onChoose,
  error,
  oneOpenNotice = "One option is open with the rest of the build as it stands.",
}: OptionListProps) {
  const openCount = options.filter((option) => option.closed === undefined).length;

  const step = (event: KeyboardEvent<HTMLInputElement>, from: number) => {
    const by = arrows[event.key];
    if (by === undefined) return;
    event.preventDefault();
    const next = options[(from + by + options.length) % options.length];
    if (next === undefined) return;
    document.getElementById(rowId(name, next.value))?.focus();
    if (next.closed === undefined && next.value !== value) onChoose(next.value);
  };

  return (
    <fieldset aria-describedby={hint === undefined ? undefined : `${name}-hint`}>
      <legend className="font-condensed text-xl font-semibold">{legend}</legend>
      {hint !== undefined && (
        <div id={`${name}-hint`} className="mt-1 max-w-text text-iron">
          {hint}
        </div>
      )}
      {error !== undefined && <FieldError id={`${name}-error`}>{error}</FieldError>}
      {openCount === 1 && options.length > 1 && (
        <p className="mt-2 flex items-start gap-2 text-sm">
          <StateMark kind="note" className="mt-0.5 size-4 shrink-0" />
          {oneOpenNotice}
        </p>
      )}
      <div className="mt-3 border-b border-rule">
        {options.map((option, index) => (
          <Row
            key={option.value}
            name={name}
            option={option}
            chosen={option.value === value}
            onChoose={onChoose}
            onArrow={(event) => {
              step(event, index);
            }}
          />
        ))}
      </div>
    </fieldset>
  );
}

const rowId = (name: string, value: string) => `${name}-${value}`;

interface RowProps {
  name: string;
  option: OptionRow;
  chosen: boolean;
  onChoose: (value: string) => void;
  onArrow: (event: KeyboardEvent<HTMLInputElement>) => void;
}

function Row({ name, option, chosen, onChoose, onArrow }: RowProps) {
  const id = rowId(name, option.value);
  const { closed } = option;
  const described = [
    closed === undefined ? null : `${id}-reason`,
    option.description === undefined ? null : `${id}-description`,
    option.effects === undefined ? null : `${id}-effects`,
  ].filter((part) => part !== null);
  return (
    <div
      className={classNames(
        "relative border-t border-rule",
        chosen && "bg-dye-wash shadow-[inset_4px_0_0_var(--dye)]",
        closed === undefined
          ? !chosen && "hover:bg-wash"
          : "before:absolute before:inset-y-0 before:left-0 before:w-2 before:hatch",
      )}
    >
      <label
        htmlFor={id}
        className={classNames(
          "flex min-h-target items-start gap-3 py-3 pr-3 pl-4",
          closed !== undefined && "cursor-not-allowed",
        )}
      >
        <input
          type="radio"
          id={id}
          name={name}
          value={option.value}
          checked={chosen}
          aria-labelledby={`${id}-name`}
          aria-disabled={closed !== undefined}
          aria-describedby={described.length === 0 ? undefined : described.join(" ")}
          onChange={() => {
            if (closed === undefined) onChoose(option.value);
          }}
          onClick={(event) => {
            if (closed !== undefined) event.preventDefault();
          }}
          onKeyDown={onArrow}
          className="mt-0.5 size-5 shrink-0 accent-dye"
        />
        <span className="flex grow flex-wrap items-baseline justify-between gap-x-6 gap-y-0.5">
          <span className="min-w-0 grow basis-56">
            <span
              id={`${id}-name`}
              className={classNames("font-medium", closed !== undefined && "text-iron")}
            >
              {option.name}
            </span>
            {option.description !== undefined && (
              <span id={`${id}-description`} className="block text-sm text-iron">
                {option.description}
              </span>
            )}
          </span>
          {option.effects !== undefined && (
            <span id={`${id}-effects`} className="flex flex-wrap gap-x-4 text-sm numerals text-iron">
              {option.effects}
            </span>
          )}
        </span>
      </label>
      {closed !== undefined && (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-1 pr-3 pb-3 pl-12">
          <p id={`${id}-reason`} className="flex min-w-0 grow basis-64 items-start gap-2 text-sm">
            <StateMark kind="stop" className="mt-0.5 size-4 shrink-0" />
            <span>
              <span className="font-semibold text-stop">Closed.</span> {closed.reason}
            </span>
          </p>
          {closed.mend}
        </div>
      )}
    </div>
  );
}
