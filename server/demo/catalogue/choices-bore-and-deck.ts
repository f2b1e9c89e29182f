import { bore } from "./bores.ts";
import type { ChoiceDocument } from "./document.ts";

/** Bore finish, decks and head threads. */
export const boreAndDeckChoices: ChoiceDocument[] = [
  bore,
  {
    id: "boreFinish",
    name: "Bore finish",
    question: "How are the cylinders delivered?",
    help: {
      what: "How much stock stays in the bores for your own hone.",
      when: "Your machinist's hone and your pistons decide. Measure the pistons before any final size is cut.",
      cost: "A finish hone takes most of an hour and a half; honing eight sizes to your pistons two hours.",
    },
    options: [
      {
        id: "rough",
        name: "Rough bored",
        description:
          "0.030 in left on the diameter. For shops that bore and hone themselves; nothing to pay.",
        values: { stock: 0.03 },
      },
      {
        id: "semiFinished",
        name: "Semi-finished",
        description:
          "0.005 in left on the diameter: only the final hone to your pistons remains. A small charge.",
        values: { stock: 0.005 },
        minutes: { thirdOperation: 20 },
      },
      {
        id: "finishHoned",
        name: "Finish-honed, torque plate",
        description:
          "Honed to the nominal size under a torque plate, ready for rings. Choose it only with pistons made for it.",
        values: { stock: 0 },
        minutes: { thirdOperation: 20, finishHone: 85 },
        leadDays: 2,
      },
      {
        id: "honedToMyPistons",
        name: "Honed to my pistons",
        description:
          "Each cylinder to its own measured skirt and your clearance, under a torque plate. Send eight sizes first.",
        minutes: { thirdOperation: 20, finishHone: 120, inspection: 10 },
        leadDays: 4,
      },
    ],
  },
  {
    id: "deckFinish",
    name: "Deck finish",
    question: "How smooth is the deck?",
    help: {
      what: "The roughness of the head face.",
      when: "The gasket decides: composite gaskets want some tooth, multi-layer steel wants it fine.",
      cost: "The fine finish is one more slow cut over both decks.",
    },
    options: [
      {
        id: "standard",
        name: "Standard",
        description: "About 60 µin Ra, for composite and copper gaskets. Included.",
      },
      {
        id: "fine",
        name: "Fine",
        description:
          "30 µin Ra or smoother, for multi-layer steel gaskets. Costs one more pass; excludes deck grooves.",
        minutes: { thirdOperation: 18 },
      },
    ],
  },
  {
    id: "deckGroove",
    name: "Deck groove",
    question: "Is a sealing groove cut round the bores?",
    help: {
      what: "A groove in the deck for a wire, or to receive a ring that stands out of the head.",
      when: "With copper gaskets and high cylinder pressure. Not with multi-layer steel.",
      cost: "Charged per block; the groove can never be taken out again.",
    },
    options: [
      { id: "none", name: "None", description: "A plain deck. Any gasket may follow later." },
      {
        id: "wire",
        name: "Wire groove",
        description: "A narrow groove round each bore that holds a soft wire against a copper gasket.",
        minutes: { thirdOperation: 30 },
      },
      {
        id: "receiver",
        name: "Receiver groove",
        description:
          "A wider groove for a ring seated in the head, for the highest boost. The heads must match.",
        minutes: { thirdOperation: 42 },
        leadDays: 3,
      },
    ],
  },
  {
    id: "headThread",
    name: "Head thread",
    question: "Which thread holds the heads?",
    help: {
      what: "The tapped holes for head bolts or studs, all of them blind.",
      when: "7/16-14 suits most heads; 1/2-13 clamps harder where boost lifts heads.",
      cost: "Larger holes take iron from beside the bores. Follow the fastener maker's procedure.",
    },
    options: [
      {
        id: "t716",
        name: "7/16-14",
        description: "The common size: any head fits without drilling. No extra.",
      },
      {
        id: "t12",
        name: "1/2-13",
        description:
          "A third more stress area for boosted engines; heads must be drilled. Not beside the largest bores.",
        minutes: { thirdOperation: 15 },
      },
    ],
  },
];
