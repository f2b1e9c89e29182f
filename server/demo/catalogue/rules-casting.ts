import { basaltBores, boreId, gneissBores, marlBores } from "./bores.ts";
import type { RuleDocument } from "./document.ts";
import { choice, common, figureAtLeast, fromMemory, invented, numberAtLeast } from "./rule-parts.ts";

const largeSpacing = { left: { value: "boreSpacing" }, is: ">" as const, right: { constant: 4.4 } };

const skirts = [1, 2, 3, 4, 5, 6, 7, 8].map((piston) => `skirt${piston}`);

/** How far a cylinder, skirt + clearance, stands off the chosen bore. */
const cylinder = (skirt: string, is: "<=" | ">=", constant: number) => ({
  left: { difference: [{ sum: [{ number: skirt }, { number: "pistonClearance" }] }, { value: "bore" }] },
  is,
  right: { constant },
});

/** Walls, decks, threads and bore finishes. */
export const castingRules: RuleDocument[] = [
  {
    id: "bores-by-family",
    kind: "table",
    severity: "stop",
    sentence: "Marl is bored 4.000 to 4.155 in, Basalt 4.000 to 4.200 in, Gneiss 4.440 to 4.640 in.",
    why: `Each casting's barrels and spacing set its range. ${invented}`,
    choices: ["family", "bore"],
    rows: [
      [["marl"], marlBores.map(boreId)],
      [["basalt"], basaltBores.map(boreId)],
      [["gneiss"], gneissBores.map(boreId)],
    ],
  },
  {
    id: "wall-naturally-aspirated",
    kind: "expression",
    severity: "stop",
    sentence: "A naturally aspirated engine needs a cylinder wall of 0.200 in or more.",
    why: `Thin walls bend under the piston's thrust and lose ring seal. ${common}`,
    when: choice("induction", "naturallyAspirated"),
    require: figureAtLeast("wall", 0.2),
  },
  {
    id: "wall-boosted",
    kind: "expression",
    severity: "stop",
    sentence: "Boost or nitrous needs a cylinder wall of 0.250 in or more.",
    why: `Higher cylinder pressure spreads the barrel. ${common}`,
    when: choice("induction", "boosted", "nitrous"),
    require: figureAtLeast("wall", 0.25),
  },
  {
    id: "web-least",
    kind: "expression",
    severity: "stop",
    sentence: "At least 0.200 in of iron must stay between two bores.",
    why: `The gasket's fire ring seals on it. ${invented}`,
    require: figureAtLeast("web", 0.2),
  },
  {
    id: "wall-near-limit",
    kind: "expression",
    severity: "caution",
    sentence: "With a nominal wall under 0.230 in, ask for the sonic report before boring on.",
    why: `Cores shift in the mould; only a reading shows the true wall. ${common}`,
    when: choice("sonicReport", "noSonic"),
    require: figureAtLeast("wall", 0.23),
  },
  {
    id: "large-head-thread",
    kind: "expression",
    severity: "stop",
    sentence: "At 4.400 in spacing, 1/2-13 head threads go with bores up to 4.165 in.",
    why: `The larger hole comes too near the barrel. ${invented}`,
    when: choice("headThread", "t12"),
    require: { any: [largeSpacing, { left: { value: "bore" }, is: "<=", right: { constant: 4.165 } }] },
  },
  {
    id: "groove-or-fine-deck",
    kind: "expression",
    severity: "stop",
    sentence: "A deck groove and the fine finish for multi-layer steel gaskets exclude each other.",
    why: `The gasket's layers would bridge the groove and leak. ${common}`,
    when: choice("deckGroove", "wire", "receiver"),
    require: choice("deckFinish", "standard"),
  },
  {
    id: "receiver-groove-thread",
    kind: "expression",
    severity: "caution",
    sentence: "A receiver groove is made for boost that lifts heads: take 1/2-13 head threads with it.",
    why: `The ring seals only as long as the head stays down. ${invented}`,
    when: choice("deckGroove", "receiver"),
    require: choice("headThread", "t12"),
  },
  {
    id: "gasket-bore",
    kind: "expression",
    severity: "stop",
    sentence: "The gasket's opening must be at least 0.010 in larger than the finish bore.",
    why: `A gasket edge that stands in the cylinder burns and is hit by the piston. ${fromMemory}`,
    require: figureAtLeast("gasketOverBore", 0.01),
  },
  {
    id: "honed-cylinders-near-bore",
    kind: "expression",
    severity: "stop",
    sentence:
      "Honed to your pistons, each of the eight skirts plus the clearance must come within 0.0025 in of the bore chosen.",
    why: `Further off, the next bore in steps of 0.005 in is the nearer one. ${invented}`,
    when: choice("boreFinish", "honedToMyPistons"),
    require: {
      all: skirts.flatMap((skirt) => [cylinder(skirt, "<=", 0.0025), cylinder(skirt, ">=", -0.0025)]),
    },
  },
  {
    id: "piston-clearance-small",
    kind: "expression",
    severity: "caution",
    sentence: "Under 0.0015 in of clearance a piston can seize when it warms faster than the block.",
    why: `Pistons grow more than iron does. ${common}`,
    when: choice("boreFinish", "honedToMyPistons"),
    require: numberAtLeast("pistonClearance", 0.0015),
  },
  {
    id: "compacted-graphite-hone",
    kind: "expression",
    severity: "note",
    sentence: "Compacted graphite iron wants its own stones and slower feeds: tell whoever hones it.",
    why: `It is tougher than grey iron, and its graphite does not break the chip. ${common}`,
    require: choice("iron", "grey40"),
  },
  {
    id: "finish-hone-pistons",
    kind: "expression",
    severity: "note",
    sentence:
      "The finish hone is to the nominal bore: measure your pistons first, the clearance cannot be put back.",
    why: `Piston makers size skirts for a clearance below the nominal bore. ${common}`,
    require: choice("boreFinish", "rough", "semiFinished", "honedToMyPistons"),
  },
  {
    id: "left-to-finish",
    kind: "expression",
    severity: "note",
    sentence:
      "The cylinders are delivered under size: bore and hone them to your pistons with a torque plate.",
    why: `Only the cylinders are left to the builder. ${common}`,
    require: choice("boreFinish", "finishHoned", "honedToMyPistons"),
  },
];
