import type { NumberDocument } from "./document.ts";

type Lengths = Pick<NumberDocument, "id" | "name" | "least" | "most" | "hint">;

/** A length on the shop's grid of 0.0001 in. */
const length = (group: string, described: Lengths): NumberDocument => ({
  ...described,
  group,
  unit: "in",
  step: 0.0001,
});

const load: NumberDocument[] = [
  {
    id: "powerAim",
    name: "Power aimed at",
    group: "Load on the parts",
    unit: "hp",
    step: 1,
    least: 50,
    most: 2500,
    hint: "At the crank. Leave empty if you do not know. It is a load on the parts, never a promise.",
  },
  {
    id: "rpmAim",
    name: "Engine speed aimed at",
    group: "Load on the parts",
    unit: "rpm",
    step: 1,
    least: 1000,
    most: 12000,
    hint: "The highest speed held under load. Leave empty if you do not know.",
  },
  {
    id: "nitrousShot",
    name: "Nitrous shot",
    group: "Nitrous",
    unit: "hp",
    step: 1,
    least: 25,
    most: 1000,
    hint: "What the largest jets are rated to add.",
    onlyWith: { choice: "induction", option: "nitrous" },
  },
];

const pistonNumbers: NumberDocument[] = [
  ...[1, 2, 3, 4, 5, 6, 7, 8].map((cylinder): NumberDocument => ({
    ...length("Your pistons, measured", {
      id: `skirt${cylinder}`,
      name: `Skirt, piston ${cylinder}`,
      least: 3.9,
      most: 4.7,
      hint: cylinder === 1 ? "At its maker's gauge point, at 68 °F." : "",
    }),
    onlyWith: { choice: "boreFinish", option: "honedToMyPistons" },
  })),
  {
    ...length("Your pistons, measured", {
      id: "pistonClearance",
      name: "Clearance asked",
      least: 0.0005,
      most: 0.02,
      hint: "On the diameter, as their maker gives it.",
    }),
    onlyWith: { choice: "boreFinish", option: "honedToMyPistons" },
  },
];

const headsAndGasket = "Heads and gasket";

const headNumbers: NumberDocument[] = [
  {
    id: "chamber",
    name: "Combustion chamber",
    group: headsAndGasket,
    unit: "cc",
    step: 0.1,
    least: 20,
    most: 200,
    hint: "One chamber of your head, with valves and plug in.",
  },
  length(headsAndGasket, {
    id: "gasketBore",
    name: "Gasket bore",
    least: 3.9,
    most: 5,
    hint: "The opening round the cylinder; it must stand clear of the bore.",
  }),
  length(headsAndGasket, {
    id: "gasketThickness",
    name: "Gasket thickness",
    least: 0.005,
    most: 0.15,
    hint: "Compressed, as its maker gives it.",
  }),
];

const ownAssembly = "Your rotating assembly";

/** Named as the values that presets carry, so that the options "own numbers" read them in their place. */
const ownNumbers: NumberDocument[] = [
  length(ownAssembly, {
    id: "stroke",
    name: "Stroke",
    least: 2.5,
    most: 5.5,
    hint: "Twice the crank's throw.",
  }),
  length(ownAssembly, {
    id: "rodLength",
    name: "Rod length",
    least: 5,
    most: 8,
    hint: "Big end to pin, centre to centre.",
  }),
  length(ownAssembly, {
    id: "compressionHeight",
    name: "Compression height",
    least: 0.5,
    most: 2.5,
    hint: "Pin centre to the piston's flat top.",
  }),
  length(ownAssembly, {
    id: "skirtLength",
    name: "Skirt below the pin",
    least: 0.2,
    most: 2.5,
    hint: "Pin centre to the skirt's lowest point.",
  }),
  length(ownAssembly, {
    id: "bossDrop",
    name: "Pin boss below the pin",
    least: 0.2,
    most: 1.5,
    hint: "Pin centre to the boss's lowest point.",
  }),
  length(ownAssembly, {
    id: "counterweightRadius",
    name: "Counterweight radius",
    least: 2,
    most: 4.5,
    hint: "Crank axis to the outermost point.",
  }),
  length(ownAssembly, {
    id: "lobeRadius",
    name: "Cam lobe radius",
    least: 0.5,
    most: 1.5,
    hint: "Cam axis to the highest lobe's nose.",
  }),
];

/** What the options "own numbers" read. */
export const ownNumberIds = ownNumbers.map(({ id }) => id);

const crownNumbers: NumberDocument[] = [
  {
    id: "dish",
    name: "Piston dish",
    group: "Piston crown",
    unit: "cc",
    step: 0.1,
    least: -60,
    most: 60,
    hint: "Volume of the dish and valve pockets; a dome is typed with a minus sign, a flat top is 0.",
  },
];

/** Every number that may be typed, in the order of the steps. */
export const numbers: NumberDocument[] = [
  ...load,
  ...pistonNumbers,
  ...headNumbers,
  ...ownNumbers,
  ...crownNumbers,
];

const idsOf = (fields: NumberDocument[]): string[] => fields.map(({ id }) => id);

/** Which step asks for which number. */
export const numbersByStep = {
  duty: idsOf(load),
  boreAndDeck: idsOf([...pistonNumbers, ...headNumbers]),
  rotatingAssembly: idsOf([...ownNumbers, ...crownNumbers]),
};
