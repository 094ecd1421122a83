import type { PreparedScenario } from "./run.js";

/** A full turn to twice the digits: the double nearest 2π, and what it leaves out. */
export const TURN = 2 * Math.PI;
export const TURN_REST = 2.4492935982947064e-16;

/** The same direction, in (-π, π]. */
export function wrap(angle: number): number {
  const rest = angle - TURN * Math.round(angle / TURN);
  return rest <= -Math.PI ? rest + TURN : rest;
}

/** 1, or -1 for an orbit that runs clockwise as seen from +z: angles count in the sense of the motion. */
export function senseOf(state: ArrayLike<number>, dimension: number): 1 | -1 {
  const half = dimension / 2;
  return state[0]! * state[half + 1]! - state[1]! * state[half]! < 0 ? -1 : 1;
}

/**
 * Angle along the orbit from the ascending node to the position (the argument of latitude), rad.
 * The node is that of the instantaneous plane, normal to L = r × v, on the xy plane.
 *
 * @param state x, y, z, vx, vy, vz
 */
function fromNode(state: ArrayLike<number>): number {
  const [x, y, z] = [state[0]!, state[1]!, state[2]!];
  const [vx, vy, vz] = [state[3]!, state[4]!, state[5]!];
  const lx = y * vz - z * vy;
  const ly = z * vx - x * vz;
  const lz = x * vy - y * vx;
  // The node lies along ẑ × L = (-ly, lx, 0); a quarter turn on along the motion lies L × (ẑ × L) / |L|.
  const along = -ly * x + lx * y;
  const ahead = (-lx * lz * x - ly * lz * y + (lx * lx + ly * ly) * z) / Math.hypot(lx, ly, lz);
  return Math.atan2(ahead, along);
}

/** The angle of a position on the scale of `apsidalAngle`, less whole turns, rad. Time form only. */
export function angleOf(
  kind: PreparedScenario["apsidalAngle"],
  sense: 1 | -1,
  state: ArrayLike<number>,
): number {
  return kind === "from-node" ? fromNode(state) : sense * Math.atan2(state[1]!, state[0]!);
}

/**
 * The angle by which one position is ahead of another in the sense of the motion, in (-π, π].
 * Longitudes are not subtracted but turned on to one another, which keeps a small angle's digits.
 */
export function ahead(
  kind: PreparedScenario["apsidalAngle"],
  sense: 1 | -1,
  from: ArrayLike<number>,
  to: ArrayLike<number>,
): number {
  if (kind === "from-node") return wrap(fromNode(to) - fromNode(from));
  const across = from[0]! * to[1]! - from[1]! * to[0]!;
  const along = from[0]! * to[0]! + from[1]! * to[1]!;
  return sense * Math.atan2(across, along);
}
