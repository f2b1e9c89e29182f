/**
 * The least distances of the swinging rods found the plain way, written apart from the product: both banks, both rods, every angle of
 * a dense turn, every edge of the outline in the block's own frame. Slow on purpose.
 */

export type Point = readonly [number, number];

export interface RodAndCrank {
  stroke: number;
  rodLength: number;
  /** Radians of each bank from vertical. */
  bankAngle: number;
  /** The right bank's outline; the left bank's is its mirror image. */
  outline: readonly Point[];
}

type Side = "right" | "left";

/** The corners of a bank's rod in the block with the crankpin at an angle clockwise from straight up. */
export function cornersAt(rods: RodAndCrank, side: Side, pinAngle: number): Point[] {
  const bank = side === "right" ? rods.bankAngle : -rods.bankAngle;
  const r = rods.stroke / 2;
  const t = pinAngle - bank;
  const pin: Point = [r * Math.sin(bank + t), r * Math.cos(bank + t)];
  const height = r * Math.cos(t) + Math.sqrt(rods.rodLength ** 2 - (r * Math.sin(t)) ** 2);
  const wrist: Point = [height * Math.sin(bank), height * Math.cos(bank)];
  const along: Point = [(wrist[0] - pin[0]) / rods.rodLength, (wrist[1] - pin[1]) / rods.rodLength];
  const across: Point = [along[1], -along[0]];
  return rods.outline.map(([a, c]) => {
    const side1 = side === "right" ? a : -a;
    return [pin[0] + side1 * across[0] + c * along[0], pin[1] + side1 * across[1] + c * along[1]] as const;
  });
}

/** Distance from a point to a segment, by the law of cosines at its ends and the area in between. */
function toSegment(p: Point, a: Point, b: Point): number {
  const ab = Math.hypot(b[0] - a[0], b[1] - a[1]);
  const ap = Math.hypot(p[0] - a[0], p[1] - a[1]);
  const bp = Math.hypot(p[0] - b[0], p[1] - b[1]);
  if (bp * bp >= ap * ap + ab * ab) return ap;
  if (ap * ap >= bp * bp + ab * ab) return bp;
  return Math.abs((b[0] - a[0]) * (p[1] - a[1]) - (b[1] - a[1]) * (p[0] - a[0])) / ab;
}

/** Signed distance from a closed polygon, negative where the polygon winds around the point. */
export function signedDistance(p: Point, corners: readonly Point[]): number {
  let least = Infinity;
  let winding = 0;
  corners.forEach((a, at) => {
    const b = corners[(at + 1) % corners.length] ?? a;
    least = Math.min(least, toSegment(p, a, b));
    const cross = (a[0] - p[0]) * (b[1] - p[1]) - (a[1] - p[1]) * (b[0] - p[0]);
    const dot = (a[0] - p[0]) * (b[0] - p[0]) + (a[1] - p[1]) * (b[1] - p[1]);
    winding += Math.atan2(cross, dot);
  });
  return Math.abs(winding) > Math.PI ? -least : least;
}

/** Least of a function over a turn: every 0.1 degrees, then every 0.0005 degrees around all that come near the least. */
function leastOverTurn(distance: (pinAngle: number) => number): number {
  const degree = Math.PI / 180;
  const coarse = Array.from({ length: 3600 }, (_, step) => distance(step * 0.1 * degree));
  const around = Math.min(...coarse);
  let least = around;
  coarse.forEach((found, step) => {
    const before = coarse[(step + 3599) % 3600] ?? 0;
    const after = coarse[(step + 1) % 3600] ?? 0;
    if (found > around + 0.01 || found > before || found > after) return;
    for (let fine = -220; fine <= 220; fine += 1) {
      least = Math.min(least, distance((step * 0.1 + fine * 0.0005) * degree));
    }
  });
  return least;
}

export function denseRodToCam(rods: RodAndCrank & { camHeight: number; lobeRadius: number }): number {
  const least = (["right", "left"] as const).map((side) =>
    leastOverTurn((angle) => signedDistance([0, rods.camHeight], cornersAt(rods, side, angle))),
  );
  return Math.min(...least) - rods.lobeRadius;
}

export interface BarrelAndRods extends RodAndCrank {
  bore: number;
  barrelBottom: number;
  bankOffset: number;
  bigEndWidth: number;
  notch: number;
}

/** Least distance to the barrels of both banks, of the own rod or of the other bank's. */
export function denseRodToBarrel(rods: BarrelAndRods, rod: "own" | "other"): number {
  const z = rods.bankOffset + rods.bigEndWidth / 2;
  const square = (rods.bore / 2) ** 2 - z ** 2;
  if (rod === "other" && square <= 0) return Infinity;
  const halfWidth = rod === "own" ? rods.bore / 2 : Math.sqrt(square);
  const least = (["right", "left"] as const).flatMap((barrel) => {
    const bank = barrel === "right" ? rods.bankAngle : -rods.bankAngle;
    const swinging: Side = (rod === "own") === (barrel === "right") ? "right" : "left";
    return [halfWidth, -halfWidth].map((w) => {
      const edge: Point = [
        rods.barrelBottom * Math.sin(bank) + w * Math.cos(bank),
        rods.barrelBottom * Math.cos(bank) - w * Math.sin(bank),
      ];
      return leastOverTurn((angle) => signedDistance(edge, cornersAt(rods, swinging, angle)));
    });
  });
  return Math.min(...least) + rods.notch;
}
