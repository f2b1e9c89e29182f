import { measureFrom, type Measured, type MeasuredOutline } from "./rod-outline.ts";

/** A fixed point that a swinging rod passes, in the rod's own bank: across the bank axis (to the right) and along it, inches. */
export interface PassedPoint {
  across: number;
  along: number;
  /** True for a rod whose outline is mirrored: the left bank's. */
  mirrored: boolean;
}

/** Nearest approach of a rod to one of the points passed. */
export interface Passing {
  /** Least signed distance from the outline to the point, inches, unrounded; negative inside. */
  distance: number;
  /** Crank angle from the rod's own top dead centre, radians, 0 up to 2 pi. */
  angle: number;
  /** Index of the point that is passed nearest. */
  point: number;
  /** The point of the rod that is nearest to it, in the rod's own bank. */
  across: number;
  along: number;
}

/** Cells of the first look at a whole turn. */
const cells = 36;
/** The search ends when nothing can be nearer than what is found by more than this, inches. */
const tolerance = 0.000_002;
const goldenShare = (Math.sqrt(5) - 1) / 2;
const wholeTurn = 2 * Math.PI;

/** An angle brought into 0 up to 2 pi. */
export function withinTurn(angle: number): number {
  const within = ((angle % wholeTurn) + wholeTurn) % wholeTurn;
  return within === wholeTurn ? 0 : within;
}

/** One point passed by the rod over the turn: its distance, how fast that changes, and bounds on both. */
class Pass {
  /** Inches a radian that the point moves in the rod's frame, at most. */
  private readonly speed: number;
  /** Inches a radian squared, at most. */
  private readonly acceleration: number;
  private readonly found: Measured = { distance: 0, across: 0, along: 0 };
  private slope = 0;

  constructor(
    private readonly outline: MeasuredOutline,
    private readonly crankThrow: number,
    private readonly rod: number,
    private readonly point: PassedPoint,
  ) {
    const ratio = crankThrow / rod;
    const furthest = Math.hypot(point.across, point.along) + crankThrow;
    // The rod leans by asin(ratio sin t): at most at `ratio` a radian, and ratio / sqrt(1 - ratio²) a radian squared.
    this.speed = crankThrow + ratio * furthest;
    this.acceleration =
      crankThrow * (1 + 2 * ratio) + furthest * (ratio * ratio + ratio / Math.sqrt(1 - ratio * ratio));
  }

  /** Signed distance at a crank angle; keeps what `noNearerThan` needs. */
  at(angle: number): number {
    const { crankThrow, rod, point, found } = this;
    const sine = crankThrow * Math.sin(angle);
    const cosine = crankThrow * Math.cos(angle);
    const upright = Math.sqrt(rod * rod - sine * sine);
    const fromPinAcross = point.across - sine;
    const fromPinAlong = point.along - cosine;
    const across = (upright * fromPinAcross + sine * fromPinAlong) / rod;
    const along = (upright * fromPinAlong - sine * fromPinAcross) / rod;
    const side = point.mirrored ? -1 : 1;
    measureFrom(this.outline, side * across, along, found);
    const lean = cosine / upright;
    const speedAcross = (sine * sine - cosine * upright) / rod + lean * along;
    const speedAlong = (sine * cosine + sine * upright) / rod - lean * across;
    const { distance } = found;
    this.slope =
      distance === 0
        ? Number.NaN
        : (speedAcross * (across - side * found.across) + speedAlong * (along - found.along)) / distance;
    return distance;
  }

  /**
   * What the distance cannot be below within `reach` of the angle last asked. The distance changes no faster than the point moves;
   * and a convex outline's distance is a convex function of the point, which lies above its tangent.
   */
  noNearerThan(reach: number): number {
    const { distance } = this.found;
    const bySpeed = distance - this.speed * reach;
    if (!this.outline.convex || Number.isNaN(this.slope)) return bySpeed;
    const byTangent = distance - Math.abs(this.slope) * reach - (this.acceleration * reach * reach) / 2;
    return Math.max(bySpeed, byTangent);
  }

  /** Angle of the least distance within `reach` of an angle, where there is one least: golden-section search. */
  leastNear(middle: number, reach: number): number {
    let [low, high] = [middle - reach, middle + reach];
    let left = high - goldenShare * (high - low);
    let right = low + goldenShare * (high - low);
    let [atLeft, atRight] = [this.at(left), this.at(right)];
    while (high - low > 1e-7) {
      if (atLeft < atRight) {
        [high, right, atRight] = [right, left, atLeft];
        left = high - goldenShare * (high - low);
        atLeft = this.at(left);
      } else {
        [low, left, atLeft] = [left, right, atRight];
        right = low + goldenShare * (high - low);
        atRight = this.at(right);
      }
    }
    return (low + high) / 2;
  }

  /** The rod's point that is nearest at a crank angle, in the rod's bank. */
  nearestOfRod(angle: number): { across: number; along: number } {
    this.at(angle);
    const { crankThrow, rod, found } = this;
    const sine = crankThrow * Math.sin(angle);
    const upright = Math.sqrt(rod * rod - sine * sine);
    const across = this.point.mirrored ? -found.across : found.across;
    return {
      across: sine + (across * upright - found.along * sine) / rod,
      along: crankThrow * Math.cos(angle) + (across * sine + found.along * upright) / rod,
    };
  }
}

/**
 * The nearest approach of a swinging rod to fixed points over a whole turn, within 0.000002 in, by branch and bound: a part of the
 * turn is left out only where `noNearerThan` proves that nothing in it is nearer than what is found.
 */
export function nearestPassing(
  outline: MeasuredOutline,
  crankThrow: number,
  rod: number,
  points: readonly PassedPoint[],
): Passing {
  const passes = points.map((point) => new Pass(outline, crankThrow, rod, point));
  const half = Math.PI / cells;
  let [least, bestAngle, bestPoint] = [Infinity, 0, 0];

  const refine = (pass: Pass, point: number, angle: number, reach: number): void => {
    const nearest = pass.leastNear(angle, reach);
    const distance = pass.at(nearest);
    if (distance < least) [least, bestAngle, bestPoint] = [distance, nearest, point];
  };
  const search = (pass: Pass, point: number, angle: number, reach: number): void => {
    const distance = pass.at(angle);
    if (pass.noNearerThan(reach) >= least - tolerance) return;
    if (distance < least - tolerance) {
      [least, bestAngle, bestPoint] = [distance, angle, point];
      refine(pass, point, angle, reach);
    }
    search(pass, point, angle - reach / 2, reach / 2);
    search(pass, point, angle + reach / 2, reach / 2);
  };

  const bounds = passes.map((pass, point) =>
    Float64Array.from({ length: cells }, (_, cell) => {
      const angle = (2 * cell + 1) * half;
      const distance = pass.at(angle);
      if (distance < least) [least, bestAngle, bestPoint] = [distance, angle, point];
      return pass.noNearerThan(half);
    }),
  );
  const first = passes[bestPoint];
  if (first !== undefined) refine(first, bestPoint, bestAngle, 2 * half);
  passes.forEach((pass, point) => {
    bounds[point]?.forEach((bound, cell) => {
      if (bound < least - tolerance) search(pass, point, (2 * cell + 1) * half, half);
    });
  });
  const nearest = passes[bestPoint]?.nearestOfRod(bestAngle) ?? { across: 0, along: 0 };
  return { distance: least, angle: withinTurn(bestAngle), point: bestPoint, ...nearest };
}
