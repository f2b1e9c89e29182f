import { lengthFromInches, measuredLength, toInches } from "../units/length.ts";
import { givenAllowance, givenLength, rodAndThrow } from "./given.ts";
import { measureOutline, type MeasuredOutline, type OutlinePoint } from "./rod-outline.ts";
import { nearestPassing, withinTurn, type PassedPoint } from "./swing.ts";

/**
 * Least distances of the swinging rods over a whole turn, for the bank at +angle from vertical looking from the front. The left
 * bank, with its outline mirrored, is the mirror image of the right, so its least distances are the same, at the
 * mirrored place and at the negative crank angle; they are told for the right bank.
 */

/** A place in the block, looking from the front: [to the right, up] from the crankshaft axis, inches. */
type Place = readonly [right: number, up: number];

export interface NearestApproach {
  /** Least distance, inches, rounded to 0.0001 in; negative = the rod would cut in. */
  value: number;
  /** Crank angle from the bank's top dead centre, radians, 0 up to 2 pi. */
  angle: number;
  /** The bank whose cylinder the angle and the place belong to. */
  bank: "right" | "left";
  /** The rod that comes nearest: the bank's own, or the other bank's on the same crankpin. */
  rod: "own" | "other";
  /** The point of the rod that comes nearest. */
  place: Place;
  /** The point of the block or the cam that it comes nearest to. */
  facing: Place;
}

interface Swing {
  /** Inches. */
  stroke: number;
  rodLength: number;
  /** Angle of each bank from vertical, radians. */
  bankAngle: number;
  /** Closed polygon of the right bank's rod. */
  outline: readonly OutlinePoint[];
}

/** Answers kept per outline. */
const mostKept = 8192;
const kept = new WeakMap<MeasuredOutline, Map<string, NearestApproach>>();

function keep(outline: MeasuredOutline, key: string, compute: () => NearestApproach): NearestApproach {
  const answers = kept.get(outline) ?? new Map<string, NearestApproach>();
  kept.set(outline, answers);
  const known = answers.get(key);
  if (known !== undefined) return known;
  if (answers.size >= mostKept) answers.clear();
  const made = compute();
  answers.set(key, made);
  return made;
}

function givenSwing(input: Swing): {
  crankThrow: number;
  rod: number;
  outline: MeasuredOutline;
  key: string;
} {
  const { crankThrow, rod } = rodAndThrow(input.stroke, input.rodLength);
  if (!(input.bankAngle >= 0 && input.bankAngle < Math.PI / 2))
    throw new RangeError("the bank angle must lie between upright and flat");
  return {
    crankThrow: toInches(crankThrow),
    rod: toInches(rod),
    outline: measureOutline(input.outline),
    key: `${crankThrow} ${rod} ${input.bankAngle}`,
  };
}

/** Turns a point of a bank's frame (across, along) into the block's. */
function inBlock(bankAngle: number, across: number, along: number): Place {
  const [sine, cosine] = [Math.sin(bankAngle), Math.cos(bankAngle)];
  return [across * cosine + along * sine, along * cosine - across * sine];
}

/** Turns a point of the block into a bank's frame. */
function inBank(bankAngle: number, [right, up]: Place): { across: number; along: number } {
  const [across, along] = inBlock(-bankAngle, right, up);
  return { across, along };
}

/**
 * Rod to cam: least distance from the rod outlines to the circle of the lobe's greatest radius around the cam axis, at its worst
 * cam angle. All lengths in inches. Throws RangeError on impossible input.
 */
export function rodToCam(input: Swing & { camHeight: number; lobeRadius: number }): NearestApproach {
  const { outline, key, ...swing } = givenSwing(input);
  const camHeight = toInches(givenLength("the cam height", input.camHeight));
  const lobeRadius = toInches(givenLength("the lobe radius", input.lobeRadius));
  return keep(outline, `cam ${key} ${camHeight} ${lobeRadius}`, () => {
    const centre: Place = [0, camHeight];
    const passed = { ...inBank(input.bankAngle, centre), mirrored: false };
    const { distance, angle, across, along } = nearestPassing(outline, swing.crankThrow, swing.rod, [passed]);
    const place = inBlock(input.bankAngle, across, along);
    const apart = Math.hypot(place[0], place[1] - camHeight);
    const share = apart === 0 ? 0 : lobeRadius / apart;
    return {
      value: toInches(measuredLength(distance - lobeRadius)),
      angle,
      bank: "right",
      rod: "own",
      place,
      facing: [place[0] * share, camHeight + (place[1] - camHeight) * share],
    };
  });
}

/**
 * Rod to barrel: least distance of both rods on a crankpin to the lower inner edges of a barrel, plus the notch of the stroke
 * clearance. The own rod passes the edges at half a bore either side; the other bank's rod passes where a chord of the bore lies
 * over the far side of its big end (bank offset + half the big end's width), and not at all if that lies outside the bore. All
 * lengths in inches. Throws RangeError on impossible input.
 */
export function rodToBarrel(
  input: Swing & {
    bore: number;
    /** Height of the barrel's lower end along the bank axis. */
    barrelBottom: number;
    bankOffset: number;
    /** Whole width of a rod's big end. */
    bigEndWidth: number;
    notch: number;
  },
): NearestApproach {
  const { outline, key, ...swing } = givenSwing(input);
  const bore = toInches(givenLength("the bore", input.bore));
  const along = toInches(givenLength("the height of the barrel bottom", input.barrelBottom));
  const far =
    toInches(givenAllowance("the bank offset", input.bankOffset)) +
    toInches(givenAllowance("the big end's width", input.bigEndWidth)) / 2;
  const notch = givenAllowance("the notch", input.notch);
  const bare = keep(outline, `barrel ${key} ${bore} ${along} ${far}`, () => {
    const { bankAngle } = input;
    const edges: { across: number; rod: "own" | "other" }[] = [
      { across: bore / 2, rod: "own" },
      { across: -bore / 2, rod: "own" },
    ];
    const chord = (bore / 2) ** 2 - far ** 2;
    if (chord > 0) {
      edges.push({ across: Math.sqrt(chord), rod: "other" }, { across: -Math.sqrt(chord), rod: "other" });
    }
    const points = edges.map(({ across, rod }): PassedPoint =>
      rod === "own"
        ? { across, along, mirrored: false }
        : { ...inBank(-bankAngle, inBlock(bankAngle, across, along)), mirrored: true },
    );
    const passing = nearestPassing(outline, swing.crankThrow, swing.rod, points);
    const edge = edges[passing.point];
    if (edge === undefined) throw new RangeError("no edge of the barrel is passed");
    const own = edge.rod === "own";
    return {
      value: toInches(measuredLength(passing.distance)),
      // The other rod's angle counts from the left bank's top dead centre; here it counts from this bank's.
      angle: own ? passing.angle : withinTurn(passing.angle - 2 * bankAngle),
      bank: "right",
      rod: edge.rod,
      place: inBlock(own ? bankAngle : -bankAngle, passing.across, passing.along),
      facing: inBlock(bankAngle, edge.across, along),
    };
  });
  return notch === 0 ? bare : { ...bare, value: toInches(lengthFromInches(bare.value) + notch) };
}
