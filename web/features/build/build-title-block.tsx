import { TitleBlock, type TitleBlockCell } from "#web/components/title-block.tsx";
import { money, pounds } from "#web/lib/format.ts";
import { useBuildDesk } from "./build-desk.tsx";
import { shortDate, stateWords, stopCount } from "./build-words.ts";
import { SpecCodeCopy } from "./spec-code-copy.tsx";

/** The strip that every sheet of the build carries. */
export function BuildTitleBlock() {
  const { current, build, evaluation } = useBuildDesk();
  const family = current.catalogue.families.find(({ id }) => id === build.answers["family"]);
  const { price, shipsOn, weight } = evaluation;
  const cells: TitleBlockCell[] = [
    { label: "Family", value: family?.name ?? "not chosen" },
    { label: "Spec code", value: <SpecCodeCopy />, wide: true },
    { label: "Weight, bare", value: weight === null ? "not known yet" : pounds(weight) },
    { label: stopCount(evaluation) === 0 ? "Answered" : "State", value: stateWords(evaluation) },
    { label: "Ships, estimate", value: shipsOn === null ? "not known yet" : shortDate(shipsOn) },
    { label: "Price", value: price === null ? "none yet" : money(price.totalCents), strong: true },
  ];
  return <TitleBlock label="Build" cells={cells} />;
}
