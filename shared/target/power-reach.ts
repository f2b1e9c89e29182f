import type { Catalogue } from "../catalogue/catalogue.ts";
import { brakeMeanEffectivePressure, meanPistonSpeed, powerRange } from "../geometry/motion-and-power.ts";
import type { Target } from "./target.ts";

/** What engines of the kind usually make, hp, at the engine speed; a load on the parts, never a promise. */
export interface PowerReach {
  low: number;
  high: number;
  rpm: number;
  /** Whether the power aimed at lies within reach; null where none is aimed at. */
  reached: boolean | null;
  /** Pressure that the aim asks for at that speed, psi; null where none is aimed at. */
  pressure: number | null;
}

const nitrous = "nitrous";

/** The mean piston speed, m/s, that a caution or stop of the catalogue holds engines to; null where none does. */
function pistonSpeedLimit({ rules }: Catalogue): number | null {
  for (const rule of rules) {
    if (rule.kind !== "expression" || rule.severity === "note" || !("left" in rule.require)) continue;
    const { left, is, right } = rule.require;
    if ("figure" in left && left.figure === "meanPistonSpeed" && is === "<=" && "constant" in right)
      return right.constant;
  }
  return null;
}

/**
 * The power range of a displacement (cu in) and stroke (in) at the speed aimed at, or at the highest that the piston-speed limit
 * allows: hp = bmep x cu in x rpm/792,000. Null where speed, pressures or the nitrous shot are not known.
 */
export function powerReach(
  catalogue: Catalogue,
  target: Target,
  engine: { cubicInches: number; stroke: number },
): PowerReach | null {
  const limit = pistonSpeedLimit(catalogue);
  const allowed =
    limit === null
      ? null
      : (limit * 1000) / meanPistonSpeed({ stroke: engine.stroke, rpm: 1000 }).metresPerSecond;
  const rpm = Math.min(target.rpm ?? Infinity, allowed ?? Infinity);
  const breathing = target.induction === nitrous ? "naturallyAspirated" : target.induction;
  const shot = target.induction === nitrous ? Number(target.have?.numbers["nitrousShot"] ?? Number.NaN) : 0;
  const range = catalogue.bmepRanges.find(
    ({ duty, induction }) => duty === target.duty && induction === breathing,
  );
  if (!Number.isFinite(rpm) || Number.isNaN(shot) || range === undefined) return null;
  const { low, high } = powerRange({
    cubicInches: engine.cubicInches,
    rpm,
    low: range.low,
    high: range.high,
  });
  const aim = target.power ?? null;
  const own = aim === null ? 0 : aim - shot;
  return {
    low: low + shot,
    high: high + shot,
    rpm,
    reached: aim === null ? null : aim <= high + shot,
    pressure:
      aim === null
        ? null
        : own <= 0
          ? 0
          : brakeMeanEffectivePressure({ horsepower: own, cubicInches: engine.cubicInches, rpm }),
  };
}
