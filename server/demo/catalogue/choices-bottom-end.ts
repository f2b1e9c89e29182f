import { rotatingAssembly } from "./assemblies.ts";
import type { ChoiceDocument } from "./document.ts";

/** Mains, caps, rear seal, oiling, stroke clearance and rotating assembly. */
export const bottomEndChoices: ChoiceDocument[] = [
  {
    id: "mainSize",
    name: "Main journal",
    question: "Which main journal size?",
    help: {
      what: "The crank's main journal; the housing is bored for its bearing shells.",
      when: "The crank you have decides.",
      cost: "The larger main is stiffer but drags more, and the one-piece seal does not fit it.",
    },
    options: [
      {
        id: "m2450",
        name: "2.450 in",
        description: "Housing 2.641 in. The small main: least drag, takes either rear seal.",
        families: ["marl", "basalt"],
        values: { mainJournal: 2.45, mainHousing: 2.641 },
      },
      {
        id: "m2650",
        name: "2.650 in",
        description: "Housing 2.841 in. More overlap for long strokes and boost; two-piece seal only.",
        families: ["basalt"],
        values: { mainJournal: 2.65, mainHousing: 2.841 },
        weight: -2,
      },
      {
        id: "m2750",
        name: "2.750 in",
        description: "Housing 2.937 in. The one size of the large family.",
        families: ["gneiss"],
        values: { mainJournal: 2.75, mainHousing: 2.937 },
      },
    ],
  },
  {
    id: "capStyle",
    name: "Main caps",
    question: "Which main caps?",
    help: {
      what: "How many bolts hold each main bearing cap, their angle, and the cap's material.",
      when: "Pick by power and engine speed; more load asks for splayed bolts and steel.",
      cost: "Splayed bolts need angled drilling; billet caps are made to order.",
    },
    options: [
      {
        id: "twoBolt",
        name: "Two-bolt",
        description: "Ductile iron, two bolts. Up to 450 hp and 6,000 rpm at no charge.",
        values: { capBolts: 2 },
      },
      {
        id: "fourBoltStraight",
        name: "Four-bolt straight, ductile iron",
        description: "Outer bolts parallel to the inner. Up to 600 hp and 7,000 rpm for a fair price.",
        values: { capBolts: 4 },
        weight: 4,
        minutes: { capFitting: 25, secondOperation: 20 },
      },
      {
        id: "fourBoltSplayedDuctile",
        name: "Four-bolt splayed, ductile iron",
        description:
          "Outer bolts angled into thicker iron. Up to 850 hp and 8,000 rpm; adds an angled set-up.",
        values: { capBolts: 4 },
        weight: 5,
        minutes: { capFitting: 35, secondOperation: 45 },
      },
      {
        id: "fourBoltSplayedBillet",
        name: "Four-bolt splayed, billet steel",
        description: "Machined from bar for anything above 850 hp. The dearest caps, with two weeks' lead.",
        values: { capBolts: 4 },
        weight: 7,
        minutes: { capFitting: 55, secondOperation: 45 },
        leadDays: 14,
      },
    ],
  },
  {
    id: "rearSeal",
    name: "Rear seal",
    question: "Which rear main seal?",
    help: {
      what: "How the crank is sealed at the flywheel end.",
      when: "The crank decides: its flange is made for one of the two.",
      cost: "The one-piece seal needs its own pan and holder.",
    },
    options: [
      {
        id: "onePiece",
        name: "One-piece",
        description:
          "A ring pressed in a holder. Seals best, only on the smaller main, and pan and crank must match.",
      },
      {
        id: "twoPiece",
        name: "Two-piece",
        description:
          "Two halves in a groove. Works with every main here and can be changed with the crank in.",
      },
    ],
  },
  {
    id: "oiling",
    name: "Oiling",
    question: "Wet sump or dry sump?",
    help: {
      what: "Where the oil pump draws from and how it enters the block.",
      when: "Wet for street and most racing; dry where long corners or pan depth ask for it.",
      cost: "Dry-sump machining drills an external feed and gives up the fuel-pump pad.",
    },
    options: [
      {
        id: "wetSump",
        name: "Wet sump",
        description: "Pump on the rear cap, oil in the pan. Nothing more to buy.",
      },
      {
        id: "drySump",
        name: "Dry sump, external feed",
        description:
          "An external pump feeds the main gallery from the front. Lower pan, no mechanical fuel pump.",
        minutes: { secondOperation: 25, inspection: 10 },
      },
    ],
  },
  {
    id: "dipstickSide",
    name: "Dipstick",
    question: "On which side is the dipstick?",
    help: {
      what: "The hole through the pan rail for the dipstick's tube.",
      when: "Your pan, your exhaust and the steering beside the engine decide.",
      cost: "Nothing. A hole that is not drilled can be drilled later, one that is cannot be taken back.",
    },
    options: [
      {
        id: "left",
        name: "Left side",
        description: "The driver's side of most cars. Check it against the pan.",
      },
      {
        id: "right",
        name: "Right side",
        description: "Where the exhaust or a steering shaft takes the left.",
      },
      {
        id: "undrilled",
        name: "Not drilled",
        description: "For a pan with a dipstick of its own, and for every dry sump.",
      },
    ],
  },
  {
    id: "strokeClearance",
    name: "Stroke clearance",
    question: "How far is the case relieved?",
    help: {
      what: "How much room is cut in the case and the barrel ends for rods and counterweights.",
      when: "As little as the rotating assembly needs. Clearances here are a check: always mock up and measure.",
      cost: "Deeper cuts take machine time and thin the case towards the pan rail.",
    },
    options: [
      {
        id: "asCast",
        name: "As cast",
        description: "No cut: the casting's own room, enough for the shorter strokes with steel rods.",
        valuesByFamily: {
          marl: { caseSwingRadius: 3.73 },
          basalt: { caseSwingRadius: 3.73 },
          gneiss: { caseSwingRadius: 4.075 },
        },
        values: { notch: 0 },
      },
      {
        id: "relieved",
        name: "Relieved",
        description:
          "About an eighth cut from the case and 0.110 in notched from the barrel ends. A modest charge.",
        valuesByFamily: {
          marl: { caseSwingRadius: 3.86 },
          basalt: { caseSwingRadius: 3.86 },
          gneiss: { caseSwingRadius: 4.205 },
        },
        values: { notch: 0.11 },
        weight: -1.5,
        minutes: { secondOperation: 30 },
      },
      {
        id: "deepRelief",
        name: "Deep relief",
        description:
          "A quarter inch out and 0.190 in notches, in the race castings only. Check pan rail and pan.",
        families: ["basalt", "gneiss"],
        valuesByFamily: { basalt: { caseSwingRadius: 3.99 }, gneiss: { caseSwingRadius: 4.34 } },
        values: { notch: 0.19 },
        weight: -3,
        minutes: { secondOperation: 55 },
      },
    ],
  },
  rotatingAssembly,
];
