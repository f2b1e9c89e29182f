import type { ChoiceDocument, OptionDocument } from "./document.ts";
import { ownNumberIds } from "./numbers.ts";

interface Assembly {
  families: string[];
  stroke: number;
  rodLength: number;
  rodKind: "steel" | "shouldered" | "aluminium";
  compressionHeight: number;
  counterweightRadius: number;
  lobeRadius: number;
  /** The deck it is made for, inches. */
  deck: number;
  /** When you want it, and what it costs you. */
  say: string;
}

const spacing4400 = ["marl", "basalt"];

const assemblies: Assembly[] = [
  {
    families: spacing4400,
    stroke: 3.48,
    rodLength: 5.7,
    rodKind: "steel",
    compressionHeight: 1.56,
    counterweightRadius: 3.1,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "The short, cheap stroke: tall stable pistons, plenty of room everywhere, less displacement.",
  },
  {
    families: spacing4400,
    stroke: 3.75,
    rodLength: 5.7,
    rodKind: "steel",
    compressionHeight: 1.425,
    counterweightRadius: 3.15,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "For pistons with the pin low and away from the rings; the skirt hangs further out of the barrel.",
  },
  {
    families: spacing4400,
    stroke: 3.75,
    rodLength: 6,
    rodKind: "steel",
    compressionHeight: 1.125,
    counterweightRadius: 3.25,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "The usual 3.750 in set: clears the case as cast; pistons are short, with the pin near the oil ring.",
  },
  {
    families: spacing4400,
    stroke: 3.75,
    rodLength: 6,
    rodKind: "shouldered",
    compressionHeight: 1.125,
    counterweightRadius: 3.25,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "Rods with heavy bolt shoulders for hard use; they swing close to the cam lobes.",
  },
  {
    families: spacing4400,
    stroke: 3.75,
    rodLength: 6,
    rodKind: "aluminium",
    compressionHeight: 1.125,
    counterweightRadius: 3.25,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "Light rods for short bursts; bulky, need the deepest stroke clearance, and are replaced on a schedule.",
  },
  {
    families: spacing4400,
    stroke: 3.875,
    rodLength: 6,
    rodKind: "steel",
    compressionHeight: 1.0625,
    counterweightRadius: 3.25,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "An eighth more stroke than the usual set; the case must be relieved for it.",
  },
  {
    families: spacing4400,
    stroke: 4,
    rodLength: 6,
    rodKind: "steel",
    compressionHeight: 1,
    counterweightRadius: 3.3,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "The longest stroke for the standard deck with ordinary pistons; case relieved, little piston above the pin.",
  },
  {
    families: ["basalt"],
    stroke: 4.125,
    rodLength: 6,
    rodKind: "steel",
    compressionHeight: 0.9375,
    counterweightRadius: 3.3,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "Most displacement under the 9.025 in deck; very short pistons and the deep relief.",
  },
  {
    families: ["basalt"],
    stroke: 4.125,
    rodLength: 5.85,
    rodKind: "steel",
    compressionHeight: 1.0875,
    counterweightRadius: 3.15,
    lobeRadius: 0.9,
    deck: 9.025,
    say: "Same stroke with a fuller piston; the short rod loads the thrust wall and lets the skirt out.",
  },
  {
    families: ["basalt"],
    stroke: 3.875,
    rodLength: 6.125,
    rodKind: "steel",
    compressionHeight: 1.2425,
    counterweightRadius: 3.3,
    lobeRadius: 0.95,
    deck: 9.325,
    say: "Tall deck, long rod, high engine speed: an easy rod angle for a little more weight.",
  },
  {
    families: ["basalt"],
    stroke: 3.875,
    rodLength: 6.125,
    rodKind: "aluminium",
    compressionHeight: 1.25,
    counterweightRadius: 3.3,
    lobeRadius: 1.05,
    deck: 9.325,
    say: "Drag set with large cam lobes: needs deep relief and at least the 55 mm tunnel.",
  },
  {
    families: ["basalt"],
    stroke: 4,
    rodLength: 6.125,
    rodKind: "steel",
    compressionHeight: 1.18,
    counterweightRadius: 3.3,
    lobeRadius: 0.95,
    deck: 9.325,
    say: "Tall deck with 4.000 in of stroke: full pistons and a good rod angle, case relieved.",
  },
  {
    families: ["basalt"],
    stroke: 4.125,
    rodLength: 6.125,
    rodKind: "shouldered",
    compressionHeight: 1.1175,
    counterweightRadius: 3.3,
    lobeRadius: 1.05,
    deck: 9.325,
    say: "The large tall-deck set for boost: shouldered rods, deep relief, large tunnel.",
  },
  {
    families: ["gneiss"],
    stroke: 4.25,
    rodLength: 6.385,
    rodKind: "steel",
    compressionHeight: 1.27,
    counterweightRadius: 3.45,
    lobeRadius: 0.95,
    deck: 9.8,
    say: "The plain big-block set: clears the case as cast and takes an everyday cam.",
  },
  {
    families: ["gneiss"],
    stroke: 4.25,
    rodLength: 6.385,
    rodKind: "shouldered",
    compressionHeight: 1.27,
    counterweightRadius: 3.45,
    lobeRadius: 0.95,
    deck: 9.8,
    say: "As the plain set with stronger shoulders, for nitrous and marine pulling.",
  },
  {
    families: ["gneiss"],
    stroke: 4.5,
    rodLength: 6.385,
    rodKind: "steel",
    compressionHeight: 1.145,
    counterweightRadius: 3.4,
    lobeRadius: 0.95,
    deck: 9.8,
    say: "A quarter more stroke under the short deck; skirts hang out and the case must be relieved.",
  },
  {
    families: ["gneiss"],
    stroke: 4.25,
    rodLength: 6.7,
    rodKind: "steel",
    compressionHeight: 1.355,
    counterweightRadius: 3.45,
    lobeRadius: 1.05,
    deck: 10.2,
    say: "Long rods in the tall deck for sustained speed; large lobes ask for the 55 mm tunnel.",
  },
  {
    families: ["gneiss"],
    stroke: 4.25,
    rodLength: 6.7,
    rodKind: "aluminium",
    compressionHeight: 1.355,
    counterweightRadius: 3.45,
    lobeRadius: 1.15,
    deck: 10.2,
    say: "Drag set with the largest lobes: deep relief, 60 mm tunnel, rods with a service life.",
  },
  {
    families: ["gneiss"],
    stroke: 4.5,
    rodLength: 6.7,
    rodKind: "steel",
    compressionHeight: 1.23,
    counterweightRadius: 3.5,
    lobeRadius: 1.05,
    deck: 10.2,
    say: "The middle tall-deck set: full pistons with 4.500 in of stroke, case relieved.",
  },
  {
    families: ["gneiss"],
    stroke: 4.75,
    rodLength: 6.7,
    rodKind: "steel",
    compressionHeight: 1.105,
    counterweightRadius: 3.5,
    lobeRadius: 1.05,
    deck: 10.2,
    say: "The longest stroke we clear: deep relief only, heavy crank, modest engine speed.",
  },
];

const kindNames = { steel: "steel rods", shouldered: "shouldered steel rods", aluminium: "aluminium rods" };

function digits(inches: number): string {
  return inches.toFixed(4).replace(".", "").replace(/0$/, "");
}

function assemblyOption(assembly: Assembly): OptionDocument {
  const { stroke, rodLength, rodKind, compressionHeight, counterweightRadius, lobeRadius, deck } = assembly;
  const large = assembly.families.includes("gneiss");
  return {
    id: `s${digits(stroke)}r${digits(rodLength)}${rodKind}`,
    name: `${stroke.toFixed(3)} stroke, ${rodLength.toFixed(3)} ${kindNames[rodKind]}`,
    description:
      `${assembly.say} Compression height ${compressionHeight.toFixed(4)} in for the ${deck.toFixed(3)} in deck, ` +
      `lobe radius ${lobeRadius.toFixed(3)} in.`,
    families: assembly.families,
    values: {
      stroke,
      rodLength,
      compressionHeight,
      counterweightRadius,
      lobeRadius,
      skirtLength: large ? 1.05 : 0.95,
      bossDrop: large ? 0.6 : 0.55,
    },
    words: { rodKind, rodOutline: large ? `${rodKind}Large` : rodKind },
  };
}

const ownKinds = [
  {
    id: "ownSteel",
    name: "steel rods",
    rodKind: "steel",
    say: "Rods with plain bolt heads: their outline is checked against case, barrel and cam.",
  },
  {
    id: "ownShouldered",
    name: "shouldered steel rods",
    rodKind: "shouldered",
    say: "Rods whose bolt shoulders stand out: they come nearest the cam.",
  },
  {
    id: "ownAluminium",
    name: "aluminium rods",
    rodKind: "aluminium",
    say: "The bulkiest outline, with the wider clearances that aluminium asks for.",
  },
] as const;

const largeRods = "Rods of the 4.840 in spacing are five hundredths larger each way.";

/**
 * Own numbers, one option for each kind of rod: so the kind is known with the answer, no question about rods stands open beside
 * a preset that has its own, and the numbers typed do not multiply the builds.
 */
const ownOptions: OptionDocument[] = [
  ...ownKinds.flatMap(({ id, name, rodKind, say }): OptionDocument[] => [
    {
      id,
      name: `Own numbers, ${name}`,
      description: `${say} Type what you have measured; what you leave empty is to be confirmed.`,
      families: spacing4400,
      words: { rodKind, rodOutline: rodKind },
      reads: ownNumberIds,
    },
    {
      id: `${id}Large`,
      name: `Own numbers, large ${name}`,
      description: `${say} ${largeRods}`,
      families: ["gneiss"],
      words: { rodKind, rodOutline: `${rodKind}Large` },
      reads: ownNumberIds,
    },
  ]),
  {
    id: "ownRodsNotKnown",
    name: "Own numbers, rods not chosen yet",
    description:
      "Stroke, lengths and heights as you type them; whatever depends on the rod's outline is to be confirmed.",
    reads: ownNumberIds,
  },
];

export const rotatingAssembly: ChoiceDocument = {
  id: "rotatingAssembly",
  name: "Rotating assembly",
  question: "Which crank, rods and pistons go in?",
  help: {
    what: "The set you will fit; we do not sell it. Its sizes say what must clear.",
    when: "Pick a set, type your own numbers, or leave it unknown: then nothing is checked against it.",
    cost: "Nothing by itself. A longer stroke or bulkier rods may ask for stroke clearance or a larger cam tunnel.",
  },
  options: [
    ...assemblies.map(assemblyOption),
    ...ownOptions,
    {
      id: "notKnown",
      name: "Not known yet",
      description:
        "Order the block first and choose the set later. Every fit to it stays to be confirmed by you.",
    },
  ],
};
