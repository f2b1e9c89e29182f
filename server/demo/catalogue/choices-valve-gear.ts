import type { ChoiceDocument } from "./document.ts";

/** Lifters, cam tunnel, cam height and drive, fuel pump. */
export const valveGearChoices: ChoiceDocument[] = [
  {
    id: "lifterStyle",
    name: "Lifters",
    question: "Which kind of lifter?",
    help: {
      what: "Flat or roller, and what keeps a roller from turning.",
      when: "Match the cam: a roller cam needs roller lifters, and the other way round.",
      cost: "Keyed bushings are fitted one by one; the others need no more machining.",
    },
    options: [
      {
        id: "flatTappet",
        name: "Flat tappet",
        description: "Turns in its bore on a flat cam. Cheapest valve gear; break it in with care.",
      },
      {
        id: "rollerRetainers",
        name: "Roller, production-type retainers",
        description:
          "Rollers held by dog-bone guides and a spider. Long life on the street where the valley is cut for it.",
        minutes: { secondOperation: 12 },
      },
      {
        id: "rollerTieBar",
        name: "Roller, tie-bar",
        description: "Rollers linked in pairs. The usual race lifter: any valley, any cam height.",
      },
      {
        id: "rollerKeyed",
        name: "Roller, keyed bushings",
        description:
          "Each roller guided in its own keyed bronze bushing of 0.937 in. For extreme spring loads, at a price.",
        minutes: { thirdOperation: 110, inspection: 20 },
        leadDays: 7,
      },
    ],
  },
  {
    id: "lifterBore",
    name: "Lifter bore",
    question: "Which lifter diameter?",
    help: {
      what: "The bore in which the lifter runs; clearance is about 0.0015 in.",
      when: "Your lifters decide; larger ones carry larger wheels and steeper lobes.",
      cost: "Larger bores are one more boring pass each.",
    },
    options: [
      {
        id: "l842",
        name: "0.842 in",
        description: "The common size; the widest range of lifters and the only one for retainers.",
        values: { lifterDiameter: 0.842 },
      },
      {
        id: "l875",
        name: "0.875 in",
        description: "A little larger wheel for racing rollers, or a broader foot for a flat tappet.",
        values: { lifterDiameter: 0.875 },
        minutes: { thirdOperation: 16 },
      },
      {
        id: "l904",
        name: "0.904 in",
        description: "A sixteenth over the common size, for steep profiles and high lift.",
        values: { lifterDiameter: 0.904 },
        minutes: { thirdOperation: 20 },
      },
      {
        id: "l937",
        name: "0.937 in",
        description: "Only with keyed bushings, whose lifters have this size.",
        values: { lifterDiameter: 0.937 },
        minutes: { thirdOperation: 24 },
      },
    ],
  },
  {
    id: "camTunnel",
    name: "Cam tunnel",
    question: "How large is the cam tunnel?",
    help: {
      what: "The cam's journals and bearings. Lobes have to pass through them.",
      when: "Plain bearings for everyday cams; rolling bearings for large lobes and stiff cores.",
      cost: "A larger tunnel takes iron out of the middle of the block and a dearer cam core.",
    },
    options: [
      {
        id: "plain",
        name: "Plain bearing",
        description: "Journals of the usual size in pressed shells; any catalogue cam fits.",
        valuesByFamily: {
          marl: { journalDiameter: 1.868 },
          basalt: { journalDiameter: 1.868 },
          gneiss: { journalDiameter: 1.948 },
        },
      },
      {
        id: "rolling50",
        name: "50 mm rolling bearing",
        description: "Needle bearings on a 50 mm core: less friction, lobes up to 0.974 in radius.",
        values: { journalDiameter: 1.9685 },
        minutes: { thirdOperation: 25 },
        leadDays: 4,
      },
      {
        id: "rolling55",
        name: "55 mm rolling bearing",
        description: "A stiff 55 mm core for heavy springs; passes lobes of 1.050 in radius.",
        values: { journalDiameter: 2.16535 },
        weight: -0.5,
        minutes: { thirdOperation: 35 },
        leadDays: 5,
      },
      {
        id: "rolling60",
        name: "60 mm rolling bearing",
        description: "The largest tunnel, for the highest lift; race castings only.",
        families: ["basalt", "gneiss"],
        values: { journalDiameter: 2.3622 },
        weight: -1,
        minutes: { thirdOperation: 45 },
        leadDays: 6,
      },
    ],
  },
  {
    id: "camBearings",
    name: "Cam bearings",
    question: "Are the cam bearings fitted?",
    help: {
      what: "The shells or rolling bearings pressed into the tunnel, lined up and measured.",
      when: "When the block comes honed and goes straight to assembly.",
      cost: "The bearings and half an hour. They cannot stay in through a hone or a hot wash.",
    },
    options: [
      {
        id: "notFitted",
        name: "Not fitted",
        description: "The tunnel is bored and clean; you press the bearings in after your last wash.",
      },
      {
        id: "fitted",
        name: "Fitted",
        description: "Pressed in with their oil holes lined up, and checked with a test bar.",
        weight: 1,
        minutes: { inspection: 30 },
      },
    ],
  },
  {
    id: "camHeight",
    name: "Cam height",
    question: "Where does the cam sit?",
    help: {
      what: "The cam's height above the crank.",
      when: "Standard unless long strokes or heavy rods need room under the cam.",
      cost: "A raised cam needs its own chain set, shorter pushrods and a distributor to suit.",
    },
    options: [
      {
        id: "standard",
        name: "Standard",
        description: "The usual place: chain sets, distributors and pushrods off the shelf.",
        valuesByFamily: {
          marl: { camHeight: 4.52 },
          basalt: { camHeight: 4.52 },
          gneiss: { camHeight: 5.15 },
        },
      },
      {
        id: "raised",
        name: "Raised 0.400 in",
        description: "More room over the rods and stiffer pushrods; special timing parts.",
        families: ["basalt", "gneiss"],
        valuesByFamily: { basalt: { camHeight: 4.92 }, gneiss: { camHeight: 5.55 } },
        minutes: { thirdOperation: 20 },
      },
    ],
  },
  {
    id: "camDrive",
    name: "Cam drive",
    question: "What drives the cam?",
    help: {
      what: "The front of the block is finished for a chain, gears or a belt.",
      when: "Chain for nearly all; gears for steady timing; belt for quick cam changes.",
      cost: "Gears hum and need an idler bore; a belt needs a sealed front and gives up the pump pad.",
    },
    options: [
      { id: "chain", name: "Chain", description: "The plain front: cheap, quiet, easy to get anywhere." },
      {
        id: "gear",
        name: "Gear",
        description: "Bored and dowelled for an idler gear. Timing does not stretch; it whines.",
        minutes: { thirdOperation: 22 },
      },
      {
        id: "belt",
        name: "Belt",
        description:
          "Front faced and drilled for a dry belt cover. Quick to adjust between runs, wants upkeep.",
        minutes: { thirdOperation: 18 },
      },
    ],
  },
  {
    id: "fuelPumpPad",
    name: "Fuel-pump pad",
    question: "Is the fuel-pump pad machined?",
    help: {
      what: "The pad on the right front side that carries a mechanical pump.",
      when: "Only when a mechanical pump worked by the cam will be used.",
      cost: "A small charge; not with dry sump, belt drive or raised cam.",
    },
    options: [
      { id: "plainPad", name: "Not machined", description: "The pad stays as cast; use an electric pump." },
      {
        id: "machinedPad",
        name: "Machined",
        description: "Faced, bored and tapped for a lever pump and its pushrod.",
        minutes: { secondOperation: 8 },
      },
    ],
  },
];
