import type { ChoiceDocument } from "./document.ts";

/** Duty, induction, family, iron and deck height. */
export const castingChoices: ChoiceDocument[] = [
  {
    id: "duty",
    name: "Duty",
    question: "What will the engine do?",
    help: {
      what: "The kind of use. It sets the usual power range and a few rules, such as plugs for sea water.",
      when: "Answer for the hardest use the block will see.",
      cost: "Nothing. It only steers what is asked for later.",
    },
    options: [
      {
        id: "street",
        name: "Street",
        description:
          "Road use on pump fuel: long life, part throttle, quiet valve gear. Costs nothing extra.",
      },
      {
        id: "circleTrack",
        name: "Circle track",
        description: "Long runs at high engine speed: heat and oil control matter most. Costs nothing extra.",
      },
      {
        id: "drag",
        name: "Drag",
        description: "Short, full-load runs: highest cylinder pressure, least time. Costs nothing by itself.",
      },
      {
        id: "marine",
        name: "Marine",
        description: "Hours at steady load with raw water about: needs threaded core plugs.",
      },
      {
        id: "offRoad",
        name: "Off-road",
        description: "Dust, jolts and steep angles: mind oil pick-up and filters. No charge for saying so.",
      },
    ],
  },
  {
    id: "induction",
    name: "Induction",
    question: "How does the engine breathe?",
    help: {
      what: "Naturally aspirated, boosted by a blower or turbo, or with nitrous oxide.",
      when: "If boost or nitrous may come later, answer so now: the walls cannot be put back.",
      cost: "Boost and nitrous hold the wall to 0.250 in, which ends the largest bores.",
    },
    options: [
      {
        id: "naturallyAspirated",
        name: "Naturally aspirated",
        description: "Air at atmospheric pressure. Walls of 0.200 in are enough, so all bores are open.",
      },
      {
        id: "boosted",
        name: "Boosted",
        description: "Blower or turbo. Pressure spreads thin walls, so 0.250 in must remain.",
      },
      {
        id: "nitrous",
        name: "Nitrous",
        description:
          "A shot on top of the engine's own breathing. Sudden pressure: 0.250 in walls as with boost.",
      },
    ],
  },
  {
    id: "family",
    name: "Family",
    question: "Which casting do you start from?",
    help: {
      what: "The casting decides bore spacing, barrel thickness, deck heights and how far a crank may swing.",
      when: "Start from the heads and crank you have, or from the displacement you want.",
      cost: "It sets the base price, most of the weight and most of the machining time.",
    },
    options: [
      {
        id: "marl",
        name: "Marl",
        description:
          "For street and club racing up to 4.155 in bore. The lowest price; takes 3.750 in of stroke as cast.",
      },
      {
        id: "basalt",
        name: "Basalt",
        description:
          "For racing up to 4.200 in bore: thicker barrels, two decks, deep relief. Thirty pounds more iron.",
      },
      {
        id: "gneiss",
        name: "Gneiss",
        description:
          "For 540 cu in and more: bores from 4.440 in and tall decks. The heaviest and dearest casting.",
      },
    ],
  },
  {
    id: "iron",
    name: "Iron",
    question: "Which iron is poured?",
    help: {
      what: "Grey iron of class 40, or compacted graphite iron, which is stronger at the same thickness.",
      when: "Grey iron serves most engines. Take compacted graphite for high boost.",
      cost: "Compacted graphite wears tools: dearer, slower to machine and poured only now and then.",
    },
    options: [
      {
        id: "grey40",
        name: "Grey iron, class 40",
        description: "Nominal 40 ksi in a test bar. Damps noise, machines cleanly, always in stock.",
      },
      {
        id: "compactedGraphite",
        name: "Compacted graphite",
        description:
          "Stiffer and stronger walls for high cylinder pressure. Longer machining and three weeks' wait.",
        families: ["basalt", "gneiss"],
        minutes: { firstOperation: 30, secondOperation: 75, thirdOperation: 30 },
        leadDays: 21,
      },
    ],
  },
  {
    id: "deckHeight",
    name: "Deck height",
    question: "How high is the deck?",
    help: {
      what: "From the crankshaft's centreline to the head face.",
      when: "It must suit the intake and the rotating assembly: stroke, rod and piston have to reach it.",
      cost: "A tall deck adds iron and asks for a wider intake, but lets a long rod in.",
    },
    options: [
      {
        id: "d9025",
        name: "9.025 in",
        description: "The standard small deck. Intakes and pushrods of the usual length fit.",
        families: ["marl", "basalt"],
        values: { deckHeight: 9.025 },
      },
      {
        id: "d9325",
        name: "9.325 in",
        description:
          "Three tenths taller, for 6.125 in rods. Needs spacers or a wide intake and longer pushrods.",
        families: ["basalt"],
        values: { deckHeight: 9.325 },
        weight: 9,
        minutes: { secondOperation: 10 },
      },
      {
        id: "d9800",
        name: "9.800 in",
        description: "The short deck of the large family, for strokes up to 4.500 in and common intakes.",
        families: ["gneiss"],
        values: { deckHeight: 9.8 },
      },
      {
        id: "d10200",
        name: "10.200 in",
        description:
          "The tall deck of the large family, for 6.700 in rods and the longest stroke. Eleven pounds more.",
        families: ["gneiss"],
        values: { deckHeight: 10.2 },
        weight: 11,
        minutes: { secondOperation: 12 },
      },
    ],
  },
];
