import type { StepDocument } from "./document.ts";
import { numbersByStep } from "./numbers.ts";

/** The steps in trade order; the review is the form's own. */
export const steps: StepDocument[] = [
  {
    id: "duty",
    name: "Duty",
    intro:
      "What the engine is for, how it breathes, and the load you aim at. Power and speed may stay unknown.",
    choices: ["duty", "induction"],
    numbers: numbersByStep.duty,
    caution:
      "Racing is dangerous. A modified engine may not be lawful on the road: local emissions and vehicle rules apply.",
  },
  {
    id: "casting",
    name: "Casting",
    intro: "The family of block, the iron it is poured from, and its deck height.",
    choices: ["family", "iron", "deckHeight"],
    caution: "A bare block weighs as much as a person. Use a hoist and a stand rated for it.",
  },
  {
    id: "bore-and-deck",
    name: "Bore and deck",
    intro: "Cylinder size and finish, and the faces and threads for the heads.",
    choices: ["bore", "boreFinish", "deckFinish", "deckGroove", "headThread"],
    numbers: numbersByStep.boreAndDeck,
    caution: "Wall thickness is nominal. Ask for a sonic check before boring on.",
  },
  {
    id: "bottom-end",
    name: "Bottom end",
    intro: "Mains, caps, rear seal and oiling.",
    choices: ["mainSize", "capStyle", "rearSeal", "oiling", "dipstickSide"],
    caution: "Follow the fastener maker's procedure for lubricant, torque and sequence.",
  },
  {
    id: "rotating-assembly",
    name: "Rotating assembly",
    intro: "The crank, rods and pistons you will fit, and the room the case gives them.",
    choices: ["rotatingAssembly", "strokeClearance"],
    numbers: numbersByStep.rotatingAssembly,
    caution:
      "Clearances here check the block against sizes entered. Every assembly must still be mocked up and measured.",
  },
  {
    id: "lifters-and-cam",
    name: "Lifters and cam",
    intro: "Lifters, cam tunnel and what drives the cam.",
    choices: [
      "lifterStyle",
      "lifterBore",
      "camTunnel",
      "camBearings",
      "camHeight",
      "camDrive",
      "fuelPumpPad",
    ],
  },
  {
    id: "finishing",
    name: "Machining and finishing",
    intro: "How the water jacket is closed, how the block is mounted and coated, and what is measured.",
    choices: ["corePlugs", "mounts", "coating", "sonicReport", "hardnessReport", "fullReport"],
    caution: "Wear eye protection for core plugs and grinding. Wash and oil the block before assembly.",
  },
  {
    id: "extras",
    name: "Extras",
    intro: "Parts that travel in the crate.",
    choices: ["dowelKit", "plugKit", "headStudKit", "mainStudKit"],
    caution: "Studs go in hand-tight. Use the kit maker's own lubricant and torque, never another's.",
  },
];
