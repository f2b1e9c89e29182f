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

/** Barrel outside diameter and core shift by family, thousandths of an inch, as in the family documents. */
const barrels = [
  { name: "Marl", bores: marlBores, outside: 4615, shift: 30 },
  { name: "Basalt", bores: basaltBores, outside: 4720, shift: 20 },
  { name: "Gneiss", bores: gneissBores, outside: 5140, shift: 20 },
];

function boreOption(thousandths: number): OptionDocument {
  const large = thousandths > 4300;
  const over = thousandths - (large ? 4440 : 4000);
  const web = ((large ? 4840 : 4400) - thousandths) / 1000;
  const walls = barrels
    .filter(({ bores: sizes }) => sizes.includes(thousandths))
    .map(
      ({ name, outside, shift }) => `${(((outside - thousandths) / 2 - shift) / 1000).toFixed(4)} in ${name}`,
    );
  const room =
    over === 0
      ? "The base bore: the thickest walls, with every overbore still ahead of you."
      : `${(over / 1000).toFixed(3)} in over the base bore.`;
  return {
    id: boreId(thousandths),
    name: `${(thousandths / 1000).toFixed(3)} in`,
    description: `${room} Nominal wall ${walls.join(", ")}; ${web.toFixed(3)} in between bores.`,
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
