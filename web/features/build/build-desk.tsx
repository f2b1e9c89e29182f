import { createContext, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from "react";
import { useLocation } from "react-router-dom";
import type { Build } from "#shared/catalogue/build.ts";
import { searchToBuild } from "#shared/catalogue/build-address.ts";
import type { CurrentCatalogue } from "#shared/contracts/catalogue.ts";
import { evaluate } from "#shared/rules/evaluate.ts";
import type { Evaluation, Mend } from "#shared/rules/evaluation.ts";
import type { Wanted } from "#shared/rules/explain.ts";
import { useAnnounce } from "#web/components/announcer.tsx";
import { searchOf } from "./build-address.ts";
import { noteBuildInProgress } from "./build-in-progress.ts";
import { choiceName, optionName, outcomeWords } from "./build-words.ts";
import { useHeldBuild } from "./held-build.ts";
import { onlyOptionsFilled, onlyOptionsFreed } from "./only-options.ts";

/** What a mend did besides the wanted option itself; `to` is null where an answer was dropped. */
export interface Changed {
  changes: { choice: string; from: string; to: string | null }[];
}

export interface BuildDesk {
  current: CurrentCatalogue;
  /** The query of the build, for links to its other steps. */
  search: string;
  build: Build;
  engraving: string;
  evaluation: Evaluation;
  /**
   * The evaluation by which the options of a choice are offered. For the family it leaves out the answers that are no
   * choice in the present family, so that they never stand against another one.
   */
  evaluationFor: (choice: string) => Evaluation;
  /** Sentences about parts of the address that could not be read. */
  problems: string[];
  /** What the last mend changed; null once anything else was done. */
  changed: Changed | null;
  choose: (choice: string, option: string) => void;
  /** Puts a wanted option in together with its mend. */
  chooseWithMend: (wanted: Wanted, mend: Mend) => void;
  /** Decimal text; null = not known. */
  setNumber: (id: string, text: string | null) => void;
  setNumberWithMend: (id: string, text: string, mend: Mend) => void;
  setEngraving: (text: string) => void;
  forgetChanged: () => void;
  undo: (() => void) | null;
  redo: (() => void) | null;
}

const DeskContext = createContext<BuildDesk | null>(null);

/** The build on the bench and all that can be done to it. Only within BuildDeskProvider. */
export function useBuildDesk(): BuildDesk {
  const desk = useContext(DeskContext);
  if (desk === null) throw new Error("the build's parts stand outside of BuildDeskProvider");
  return desk;
}

interface BuildDeskProviderProps {
  current: CurrentCatalogue;
  children: ReactNode;
}

/** Holds the build, evaluates it once for each change, and has one message read out for each. */
export function BuildDeskProvider({ current, children }: BuildDeskProviderProps) {
  const { catalogue } = current;
  const held = useHeldBuild();
  const { search } = held;
  const read = useMemo(() => searchToBuild(catalogue, new URLSearchParams(search)), [catalogue, search]);
  const evaluation = useMemo(() => evaluate(current, read.build), [current, read.build]);
  const [changed, setChanged] = useState<(Changed & { search: string }) | null>(null);
  const [why, setWhy] = useState<Why | null>(null);
  useOutcome(search, evaluation, why);
  useProgressNote(search);

  const desk = useMemo((): BuildDesk => {
    const { build } = read;
    const engraving = read.engraving ?? "";
    let freed: Evaluation | null = null;
    const withoutOnlyOptions = (): Evaluation =>
      (freed ??= evaluate(current, { ...build, answers: onlyOptionsFreed(catalogue, build.answers) }));
    const put = (next: Build, words: string, mended: Changed["changes"] | null = null) => {
      const moved = next.answers["family"] !== build.answers["family"];
      const answers = moved ? onlyOptionsFilled(catalogue, next.answers) : next.answers;
      const address = searchOf(catalogue, { ...next, answers }, engraving, search);
      setWhy({ from: search, words });
      setChanged(mended === null ? null : { changes: mended, search: address });
      held.put(address);
    };
    const withNumber = (id: string, text: string | null): Build => {
      const others = Object.entries(build.numbers).filter(([name]) => name !== id);
      return { ...build, numbers: Object.fromEntries(text === null ? others : [...others, [id, text]]) };
    };
    const told = (act: (() => void) | null, words: string) =>
      act === null
        ? null
        : () => {
            setWhy({ from: search, words });
            act();
          };
    const mendedWords = (changes: Changed["changes"]) =>
      changes
        .map(({ choice, to }) =>
          to === null
            ? `${choiceName(catalogue, choice)} dropped.`
            : `${choiceName(catalogue, choice)} changed to ${optionName(catalogue, choice, to)}.`,
        )
        .join(" ");

    return {
      current,
      search,
      build,
      engraving,
      evaluation,
      evaluationFor: (choice) => (choice === "family" ? withoutOnlyOptions() : evaluation),
      problems: read.problems.map(({ message }) => message),
      changed: changed?.search === search ? changed : null,
      choose(choice, option) {
        if (build.answers[choice] === option) return;
        const answers = choice === "family" ? withoutOnlyOptions().build.answers : build.answers;
        put({ ...build, answers: { ...answers, [choice]: option } }, "");
      },
      chooseWithMend(wanted, mend) {
        const answers = wanted.choice === "family" ? withoutOnlyOptions().build.answers : build.answers;
        put(
          { ...build, answers: mended({ ...answers, [wanted.choice]: wanted.option }, mend) },
          mendedWords(mend.changes),
          mend.changes,
        );
      },
      setNumber(id, text) {
        if ((build.numbers[id] ?? null) !== text) put(withNumber(id, text), "");
      },
      setNumberWithMend(id, text, mend) {
        const next = withNumber(id, text);
        put({ ...next, answers: mended(next.answers, mend) }, mendedWords(mend.changes), mend.changes);
      },
      setEngraving(text) {
        setWhy(null);
        held.put(searchOf(catalogue, build, text, search), true);
      },
      forgetChanged() {
        setChanged(null);
      },
      undo: told(held.undo, "Undone."),
      redo: told(held.redo, "Done again."),
    };
  }, [catalogue, changed, current, evaluation, held, read, search]);
  return <DeskContext value={desk}>{children}</DeskContext>;
}

function mended(answers: Build["answers"], mend: Mend): Build["answers"] {
  const changed = new Map(mend.changes.map(({ choice, to }) => [choice, to]));
  const kept = Object.entries(answers).filter(([choice]) => !changed.has(choice));
  const replaced = [...changed].flatMap(([choice, to]) => (to === null ? [] : [[choice, to] as const]));
  return Object.fromEntries([...kept, ...replaced]);
}

/** What is to be said of the change that is being made, and of which build it was made. */
interface Why {
  from: string;
  words: string;
}

/** One polite message for each change that was made here; an engraving, or a link to another build, says nothing. */
function useOutcome(search: string, evaluation: Evaluation, why: Why | null): void {
  const announce = useAnnounce();
  const said = useRef({ search, evaluation });
  useEffect(() => {
    const before = said.current;
    if (before.search === search) return;
    said.current = { search, evaluation };
    if (why?.from !== before.search) return;
    announce(`${why.words} ${outcomeWords(before.evaluation, evaluation)}`.trim());
  }, [announce, evaluation, search, why]);
}

function useProgressNote(search: string): void {
  const { pathname } = useLocation();
  useEffect(() => {
    if (search === "") return;
    const timer = setTimeout(() => {
      noteBuildInProgress(`${pathname}${search}`);
    }, 0);
    return () => {
      clearTimeout(timer);
    };
  }, [pathname, search]);
}
