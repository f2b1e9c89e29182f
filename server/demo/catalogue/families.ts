import type { FamilyDocument } from "./document.ts";

/** Facts of every family: shown, not chosen. Common practice, no published source, unless said otherwise. */
const commonFacts: FamilyDocument["facts"] = [
  {
    name: "Oil order",
    value: "Main bearings first, then cam and lifters",
    why: "The mains carry the load, so the gallery reaches them before anything above.",
  },
  {
    name: "Decks",
    value: "Extra thick, machined even and parallel to the mains",
    why: "A thick, true deck holds its gasket; both banks stand at one height.",
  },
  {
    name: "Bores",
    value: "Cut with room for hone over-travel",
    why: "The stones can run past the lower end, so the bore stays straight to the bottom.",
  },
  {
    name: "Delivered finished",
    value: "Main bores, cam bores and decks",
    why: "Only the cylinders are left to your final hone, unless you buy a finish hone.",
  },
  {
    name: "Head fasteners",
    value: "Blind holes: no thread sealer needed",
    why: "The holes end in iron and do not reach the water.",
  },
  {
    name: "Routing",
    value:
      "Casting qualified first; caps fitted after the second operation; third operation locates on the decks",
    why: "The second operation takes most of the metal and the most time; mains and cam are bored from the decks.",
  },
  {
    name: "Before shipping",
    value: "Oil galleries and machined faces inspected",
    why: "A chip left in a gallery ends up in a bearing.",
  },
  { name: "Starter side", value: "Right, low on the bell-housing face", why: "" },
  { name: "Bell-housing dowels", value: "Two, fitted", why: "" },
];

/** The three families of the demo shop; every figure is invented. */
export const families: FamilyDocument[] = [
  {
    id: "marl",
    name: "Marl",
    summary: "4.400 in bore spacing. The affordable street and club-racing block.",
    values: {
      boreSpacing: 4.4,
      barrelOutsideDiameter: 4.615,
      coreShift: 0.03,
      barrelBottom: 3.375,
      baseDeckHeight: 9.025,
      baseBore: 4,
      cylinders: 8,
      bankAngle: 45,
      bankOffset: 0.92,
      bigEndWidth: 0.94,
      deckThickness: 0.6,
      retainerValley: 1,
    },
    weight: 185,
    minutes: {
      qualify: 35,
      firstOperation: 95,
      secondOperation: 210,
      capFitting: 45,
      thirdOperation: 120,
      wash: 25,
      inspection: 50,
      pack: 25,
    },
    // Stress relief and ageing of the castings before the first cut; invented for the demo.
    leadDays: 14,
    facts: [
      {
        name: "Valley",
        value: "Machined for production-type roller-lifter retainers",
        why: "Rollers with stock guides drop in without drilling.",
      },
      { name: "Deck thickness", value: "0.600 in", why: "Invented for the demo." },
      { name: "Head-bolt holes", value: "17 a bank, blind", why: "Invented for the demo." },
      { name: "Clutch-linkage boss", value: "Drilled and tapped", why: "" },
      ...commonFacts,
    ],
    crate: { length: 32, width: 26, height: 24, weight: 48 },
  },
  {
    id: "basalt",
    name: "Basalt",
    summary: "4.400 in bore spacing. Thicker barrels and two deck heights, for racing.",
    values: {
      boreSpacing: 4.4,
      barrelOutsideDiameter: 4.72,
      coreShift: 0.02,
      barrelBottom: 3.375,
      baseDeckHeight: 9.025,
      baseBore: 4,
      cylinders: 8,
      bankAngle: 45,
      bankOffset: 0.92,
      bigEndWidth: 0.94,
      deckThickness: 0.7,
      retainerValley: 0,
    },
    weight: 215,
    minutes: {
      qualify: 45,
      firstOperation: 110,
      secondOperation: 255,
      capFitting: 55,
      thirdOperation: 140,
      wash: 30,
      inspection: 65,
      pack: 25,
    },
    // Stress relief and ageing of the castings before the first cut; invented for the demo.
    leadDays: 18,
    facts: [
      {
        name: "Valley",
        value: "Plain, with screw-in vent plugs",
        why: "Race lifters carry their own guides.",
      },
      { name: "Deck thickness", value: "0.700 in", why: "Invented for the demo." },
      { name: "Head-bolt holes", value: "17 a bank, blind", why: "Invented for the demo." },
      { name: "Clutch-linkage boss", value: "Cast, left undrilled", why: "" },
      ...commonFacts,
    ],
    crate: { length: 32, width: 27, height: 26, weight: 52 },
  },
  {
    id: "gneiss",
    name: "Gneiss",
    summary: "4.840 in bore spacing. Big bore, tall deck, for the largest engines.",
    values: {
      boreSpacing: 4.84,
      barrelOutsideDiameter: 5.14,
      coreShift: 0.02,
      barrelBottom: 3.65,
      baseDeckHeight: 9.8,
      baseBore: 4.44,
      cylinders: 8,
      bankAngle: 45,
      bankOffset: 0.92,
      bigEndWidth: 0.94,
      deckThickness: 0.75,
      retainerValley: 0,
    },
    weight: 275,
    minutes: {
      qualify: 50,
      firstOperation: 130,
      secondOperation: 310,
      capFitting: 60,
      thirdOperation: 165,
      wash: 35,
      inspection: 75,
      pack: 30,
    },
    // Stress relief and ageing of the castings before the first cut; invented for the demo.
    leadDays: 25,
    facts: [
      {
        name: "Valley",
        value: "Plain, with bosses for oil drains",
        why: "Race lifters carry their own guides.",
      },
      { name: "Deck thickness", value: "0.750 in", why: "Invented for the demo." },
      { name: "Head-bolt holes", value: "16 a bank, blind", why: "Invented for the demo." },
      { name: "Clutch-linkage boss", value: "None", why: "" },
      ...commonFacts,
    ],
    crate: { length: 35, width: 29, height: 28, weight: 58 },
  },
];
