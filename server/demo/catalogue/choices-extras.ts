import type { ChoiceDocument } from "./document.ts";

/** Kits that travel in the crate. */
export const extraChoices: ChoiceDocument[] = [
  {
    id: "dowelKit",
    name: "Dowel kit",
    question: "Add the dowel kit?",
    help: {
      what: "Head, timing-cover and bell-housing dowels in the box with the block.",
      when: "If your old block's dowels are not to be used again.",
      cost: "The price of the pins; you tap them in.",
    },
    options: [
      {
        id: "noDowels",
        name: "No dowel kit",
        description: "Bring your own pins; the holes are reamed either way.",
      },
      {
        id: "dowels",
        name: "With dowel kit",
        description: "All pins in one bag, sized to our holes.",
        weight: 0.5,
      },
    ],
  },
  {
    id: "plugKit",
    name: "Plug kit",
    question: "Add the plug kit?",
    help: {
      what: "Core plugs of the kind chosen, and every gallery and drain plug of the block.",
      when: "For a block that is built up new; not when the old plugs are good.",
      cost: "A small charge. You fit them after the last wash, with eye protection on.",
    },
    options: [
      {
        id: "noPlugs",
        name: "No plug kit",
        description: "Plugs from your own shelf; the sheet in the crate lists the sizes.",
      },
      {
        id: "plugs",
        name: "With plug kit",
        description: "All plugs in one bag, counted, with the sealer they want.",
        weight: 1,
      },
    ],
  },
  {
    id: "headStudKit",
    name: "Head stud kit",
    question: "Add head studs?",
    help: {
      what: "Studs, nuts and hardened washers for both heads, in the thread chosen.",
      when: "Where heads come off often, or cylinder pressure is high.",
      cost: "The price of the kit and its weight; the block itself stays the same.",
    },
    options: [
      {
        id: "noHeadStuds",
        name: "No head studs",
        description: "Bolts or studs of your own; every hole is blind and tapped alike.",
      },
      {
        id: "headStuds",
        name: "With head studs",
        description: "A full set with its maker's lubricant and torque sheet.",
        weight: 9,
      },
    ],
  },
  {
    id: "mainStudKit",
    name: "Main stud kit",
    question: "Add main studs?",
    help: {
      what: "Studs in place of the main caps' bolts; the mains are then bored with them in.",
      when: "Where caps come off often. Decide before the mains are bored.",
      cost: "The kit and a quarter of an hour of fitting.",
    },
    options: [
      {
        id: "noMainStuds",
        name: "Main bolts",
        description: "The bolts that come with the caps; mains are bored with them at their torque.",
      },
      {
        id: "mainStuds",
        name: "With main studs",
        description: "Fitted for boring and left in their holes; splayed outer holes keep their bolts.",
        weight: 2,
        minutes: { capFitting: 15 },
      },
    ],
  },
];
