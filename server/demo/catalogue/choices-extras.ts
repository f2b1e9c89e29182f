import type { ChoiceDocument } from "./document.ts";

/** Plugs, dowels and reports. */
export const extraChoices: ChoiceDocument[] = [
  {
    id: "corePlugs",
    name: "Core plugs",
    question: "How are the core holes closed?",
    help: {
      what: "Plugs in the holes where the sand of the water jacket came out.",
      when: "Pressed for most; threaded where a plug must not come out.",
      cost: "Threaded holes are tapped and their plugs cost more. Wear eye protection when fitting plugs.",
    },
    options: [
      {
        id: "pressed",
        name: "Pressed",
        description: "Cups driven in with sealer, by you, after cleaning. Cheap and quick to renew.",
      },
      {
        id: "threaded",
        name: "Threaded",
        description: "Tapped holes with screwed plugs. Asked for by marine use; safe under pressure tests.",
        minutes: { secondOperation: 28 },
      },
    ],
  },
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
    id: "sonicReport",
    name: "Sonic report",
    question: "Measure the walls and report them?",
    help: {
      what: "Ultrasonic wall readings of every cylinder: six heights, four sides.",
      when: "Before boring on, and whenever the nominal wall is near its limit.",
      cost: "Three quarters of an hour at inspection.",
    },
    options: [
      {
        id: "noSonic",
        name: "No report",
        description: "The nominal wall holds with our core-shift allowance, but no reading is written down.",
      },
      {
        id: "sonic",
        name: "With report",
        description: "Every reading on a sheet with the block's serial number.",
        minutes: { inspection: 45 },
      },
    ],
  },
  {
    id: "hardnessReport",
    name: "Hardness report",
    question: "Test and report the iron's hardness?",
    help: {
      what: "Brinell readings on both decks and a main web.",
      when: "When a series or an engine builder asks for the iron's proof.",
      cost: "A quarter of an hour and three small marks on faces that do not seal.",
    },
    options: [
      {
        id: "noHardness",
        name: "No hardness test",
        description: "The lot's foundry certificate stays on file with us.",
      },
      {
        id: "hardness",
        name: "Hardness tested",
        description: "Readings of this very block, beside the heat number of its iron.",
        minutes: { inspection: 15 },
      },
    ],
  },
];
