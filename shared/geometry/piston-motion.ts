import { givenAbove } from "./given.ts";

/** 1 in = 0.0254 m exactly. */
const metresPerInch = 0.0254;
/** Standard gravity, in/s²: 9.80665 m/s² exactly. */
const gravity = 9.80665 / metresPerInch;

interface Crank {
  /** Inches. */
  stroke: number;
  rodLength: number;
}

function throwOf({ stroke, rodLength }: Crank): number {
  givenAbove("the stroke", stroke);
  givenAbove("the rod length", rodLength);
  if (rodLength <= stroke / 2) throw new RangeError("the rod is shorter than half the stroke");
  return stroke / 2;
}

/**
 * Slider crank without pin offset, exactly: at a crank angle from top dead centre (radians) the wrist pin's height over the crank
 * axis, inches; its velocity for one radian a second, in/rad; its acceleration likewise, in/rad². Up is positive.
 */
export function pistonMotion(input: Crank & { angle: number }): {
  height: number;
  velocity: number;
  acceleration: number;
} {
  const crankThrow = throwOf(input);
  if (!Number.isFinite(input.angle)) throw new RangeError("the crank angle must be a finite number");
  const [sine, cosine] = [Math.sin(input.angle), Math.cos(input.angle)];
  const across = crankThrow * sine;
  const upright = Math.sqrt(input.rodLength ** 2 - across ** 2);
  const square = crankThrow ** 2;
  return {
    height: crankThrow * cosine + upright,
    velocity: -across - (square * sine * cosine) / upright,
    acceleration:
      -crankThrow * cosine -
      (square * (cosine ** 2 - sine ** 2)) / upright -
      (square * sine * cosine) ** 2 / upright ** 3,
  };
}

/** Crank angle after top dead centre, radians, at which the piston is fastest: there its acceleration passes zero. */
export function angleOfPeakSpeed(input: Crank): number {
  let [low, high] = [0, Math.PI / 2];
  for (;;) {
    const middle = (low + high) / 2;
    if (middle <= low || middle >= high) return middle;
    if (pistonMotion({ ...input, angle: middle }).acceleration < 0) low = middle;
    else high = middle;
  }
}

/** Peak piston speed at an engine speed, from the exact motion: m/s and ft/min, and the crank angle, radians. */
export function peakPistonSpeed(input: Crank & { rpm: number }): {
  metresPerSecond: number;
  feetPerMinute: number;
  angle: number;
} {
  givenAbove("the engine speed", input.rpm);
  const angle = angleOfPeakSpeed(input);
  const perRadian = Math.abs(pistonMotion({ ...input, angle }).velocity);
  const radiansPerMinute = 2 * Math.PI * input.rpm;
  return {
    metresPerSecond: (perRadian * metresPerInch * radiansPerMinute) / 60,
    feetPerMinute: (perRadian * radiansPerMinute) / 12,
    angle,
  };
}

/** Angles of the first look for the greatest upward acceleration. */
const looks = 180;

/**
 * Greatest piston acceleration at an engine speed, either way, in standard gravities (9.80665 m/s²), and its crank angle, radians.
 * At top dead centre, r (1 + r/L), but for rods hardly longer than half the stroke, where it is near a quarter turn.
 */
export function peakPistonAcceleration(input: Crank & { rpm: number }): { gravities: number; angle: number } {
  givenAbove("the engine speed", input.rpm);
  const upward = (angle: number): number => pistonMotion({ ...input, angle }).acceleration;
  let angle = 0;
  let most = -upward(0);
  let step = Math.PI / looks;
  let best = step;
  for (let look = 0; look <= looks; look += 1) if (upward(look * step) > upward(best)) best = look * step;
  while (step > 1e-9) {
    step /= 2;
    for (const beside of [best - step, best + step]) if (upward(beside) > upward(best)) best = beside;
  }
  if (upward(best) > most) [angle, most] = [best, upward(best)];
  const radiansPerSecond = (2 * Math.PI * input.rpm) / 60;
  return { gravities: (most * radiansPerSecond ** 2) / gravity, angle };
}
