import { demoCatalogue } from "#server/demo/catalogue/catalogue.ts";
import { demoPriceList } from "#server/demo/catalogue/price-list.ts";
import type { Build } from "#shared/catalogue/build.ts";
import type { EvaluationContext } from "#shared/rules/evaluation.ts";

/** The demo shop on a quiet day. */
export const demoContext: EvaluationContext = {
  catalogue: demoCatalogue,
  priceList: demoPriceList,
  load: { minutes: { secondOperation: 6000, inspection: 900 } },
  today: "2026-12-01",
};

/** A build with these answers and typed numbers. */
export function buildOf(
  answers: Build["answers"],
  numbers: Build["numbers"] = {},
  mine: string[] = [],
): Build {
  return { answers, numbers, mine };
}

/** A whole Marl: 4.125 in bore, 3.750 in stroke, steel rods, as cast. */
export const marl400: Build = buildOf({
  duty: "street",
  induction: "naturallyAspirated",
  family: "marl",
  iron: "grey40",
  deckHeight: "d9025",
  bore: "b4125",
  boreFinish: "semiFinished",
  deckFinish: "standard",
  deckGroove: "none",
  headThread: "t716",
  mainSize: "m2450",
  capStyle: "fourBoltStraight",
  rearSeal: "twoPiece",
  oiling: "wetSump",
  dipstickSide: "left",
  strokeClearance: "asCast",
  rotatingAssembly: "s3750r6000steel",
  lifterStyle: "rollerRetainers",
  lifterBore: "l842",
  camTunnel: "plain",
  camBearings: "notFitted",
  camHeight: "standard",
  camDrive: "chain",
  fuelPumpPad: "machinedPad",
  corePlugs: "pressed",
  mounts: "side",
  coating: "oiled",
  sonicReport: "sonic",
  hardnessReport: "noHardness",
  fullReport: "noFullReport",
  dowelKit: "dowels",
  plugKit: "noPlugs",
  headStudKit: "noHeadStuds",
  mainStudKit: "noMainStuds",
});
