import type { ChoiceDocument } from "./document.ts";

/** Core plugs, mounts, coating and reports. */
export const finishingChoices: ChoiceDocument[] = [
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
    id: "mounts",
    name: "Mounts",
    question: "How does the engine hang in the frame?",
    help: {
      what: "The tapped bosses on the sides, or besides them a front face drilled for a plate.",
      when: "Side mounts for every road car; a front plate where the chassis is built for one.",
      cost: "A front plate's holes take a set-up, and the plate covers the fuel-pump pad.",
    },
    options: [
      {
        id: "side",
        name: "Side mounts",
        description: "Three tapped bosses a side, as most frames want them. Included.",
      },
      {
        id: "frontPlate",
        name: "Front plate",
        description: "Front face drilled and dowelled for a plate; the side bosses stay usable.",
        minutes: { secondOperation: 16 },
      },
    ],
  },
  {
    id: "coating",
    name: "Coating",
    question: "Is the iron coated?",
    help: {
      what: "What protects the raw iron outside, and inside above the crank.",
      when: "Paint where the block stays in damp air; sealer inside where oil should run off quickly.",
      cost: "Masking and drying: days more than money. Wash the block before assembly all the same.",
    },
    options: [
      {
        id: "oiled",
        name: "Oiled only",
        description: "Preserving oil and a sealed bag. Machined iron rusts within hours once it is washed.",
      },
      {
        id: "painted",
        name: "Painted outside",
        description: "Two coats of grey engine enamel, machined faces masked.",
        weight: 0.5,
        minutes: { wash: 20, pack: 25 },
        leadDays: 2,
      },
      {
        id: "sealed",
        name: "Painted, valley and case sealed",
        description: "Paint outside, and oil-proof sealer on raw iron in the valley and the case.",
        weight: 1,
        minutes: { wash: 35, pack: 40 },
        leadDays: 4,
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
  {
    id: "fullReport",
    name: "Full measurement report",
    question: "Report every measured size?",
    help: {
      what: "Every bore, main, cam bore, lifter bore, deck corner and thread as measured, beside its limits.",
      when: "When the builder assembles to figures, or a class asks for papers.",
      cost: "An hour and a quarter at inspection. The wall readings are part of it.",
    },
    options: [
      {
        id: "noFullReport",
        name: "No full report",
        description: "The inspection sheet with bores, mains and decks comes with every block.",
      },
      {
        id: "fullReport",
        name: "With full report",
        description: "Some two hundred readings of this block, with the gauge each was taken with.",
        minutes: { inspection: 75 },
        leadDays: 1,
      },
    ],
  },
];
