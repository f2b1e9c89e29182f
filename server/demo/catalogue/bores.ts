import type { ChoiceDocument, OptionDocument } from "./document.ts";

/** Finish bores by 0.005 in from one size to another, both in; thousandths of an inch. */
function bores(from: number, to: number): number[] {
  return Array.from({ length: (to - from) / 5 + 1 }, (_, index) => from + index * 5);
}

export function boreId(thousandths: number): string {
  return `b${thousandths}`;
}

export const marlBores = bores(4000, 4155);
export const basaltBores = bores(4000, 4200);
export const gneissBores = bores(4440, 4640);

const boreSpacings = { small: 4400, large: 4840 };

function boreOption(thousandths: number): OptionDocument {
  const inches = (thousandths / 1000).toFixed(3);
  const spacing = thousandths < 4300 ? boreSpacings.small : boreSpacings.large;
  const base = thousandths < 4300 ? 4000 : 4440;
  const web = ((spacing - thousandths) / 1000).toFixed(3);
  const over = thousandths - base;
  const room =
    over === 0
      ? "The base bore: the thickest walls and all the overbores still ahead of you."
      : `${(over / 1000).toFixed(3)} in over base, which takes ${(over / 2000).toFixed(4)} in from every wall.`;
  return {
    id: boreId(thousandths),
    name: `${inches} in`,
    description: `${room} Leaves ${web} in between bores.`,
    values: { bore: thousandths / 1000 },
  };
}

export const bore: ChoiceDocument = {
  id: "bore",
  name: "Bore",
  question: "What is the finish bore?",
  help: {
    what: "The cylinder's size after your final hone, in steps of 0.005 in.",
    when: "Match the pistons you have, or stay small to keep walls thick for later rebuilds.",
    cost: "Every step takes iron from the walls. Walls are nominal: ask for a sonic check before boring on.",
  },
  options: [...new Set([...basaltBores, ...gneissBores])].map(boreOption),
};
