import { priceListSchema, type PriceList } from "#shared/pricing/price-list.ts";
import { demoCatalogue } from "./catalogue.ts";

type Amount = number | Record<string, number>;

const dollars = (amount: number): number => amount * 100;
const byFamily = (marl: number, basalt: number, gneiss: number): Record<string, number> => ({
  marl: dollars(marl),
  basalt: dollars(basalt),
  gneiss: dollars(gneiss),
});

/** What costs more or less than nothing; invented amounts. */
const charged: Record<string, Record<string, Amount>> = {
  iron: { compactedGraphite: dollars(1180) },
  deckHeight: { d9325: dollars(165), d10200: dollars(210) },
  boreFinish: {
    rough: dollars(-60),
    finishHoned: byFamily(285, 310, 345),
    honedToMyPistons: byFamily(390, 415, 455),
  },
  deckFinish: { fine: dollars(95) },
  deckGroove: { wire: dollars(185), receiver: dollars(265) },
  headThread: { t12: dollars(75) },
  mainSize: { m2650: dollars(90) },
  capStyle: {
    fourBoltStraight: byFamily(240, 0, 0),
    fourBoltSplayedDuctile: byFamily(520, 290, 320),
    fourBoltSplayedBillet: byFamily(1240, 860, 940),
  },
  rearSeal: { onePiece: dollars(45) },
  oiling: { drySump: dollars(190) },
  strokeClearance: { relieved: byFamily(145, 145, 170), deepRelief: byFamily(290, 290, 335) },
  lifterStyle: { rollerRetainers: dollars(70), rollerKeyed: dollars(1450) },
  lifterBore: { l875: dollars(120), l904: dollars(145), l937: dollars(160) },
  camTunnel: { rolling50: dollars(310), rolling55: dollars(390), rolling60: dollars(470) },
  camBearings: { fitted: dollars(95) },
  camHeight: { raised: dollars(275) },
  camDrive: { gear: dollars(130), belt: dollars(110) },
  fuelPumpPad: { machinedPad: dollars(38) },
  corePlugs: { threaded: dollars(115) },
  mounts: { frontPlate: dollars(85) },
  coating: { painted: dollars(65), sealed: dollars(140) },
  sonicReport: { sonic: dollars(125) },
  hardnessReport: { hardness: dollars(48) },
  fullReport: { fullReport: dollars(165) },
  dowelKit: { dowels: dollars(32) },
  plugKit: { plugs: dollars(44) },
  headStudKit: { headStuds: byFamily(265, 265, 310) },
  mainStudKit: { mainStuds: byFamily(135, 150, 175) },
};

const options = Object.fromEntries(
  demoCatalogue.choices
    .filter((choice) => choice.id !== "family")
    .map((choice) => [
      choice.id,
      Object.fromEntries(choice.options.map((option) => [option.id, charged[choice.id]?.[option.id] ?? 0])),
    ]),
);

/** The demo shop's retail price list. */
export const demoPriceList: PriceList = priceListSchema.parse({
  version: 1,
  name: "Retail",
  effectiveOn: "2026-01-05",
  currency: "USD",
  families: byFamily(2940, 3960, 5240),
  options,
  freightByZone: {
    "0": dollars(395),
    "1": dollars(375),
    "2": dollars(345),
    "3": dollars(335),
    "4": dollars(265),
    "5": dollars(255),
    "6": dollars(245),
    "7": dollars(295),
    "8": dollars(355),
    "9": dollars(415),
  },
});
