import { add, type DoubleDouble, multiply, negate, sqrt, subtract } from "../arithmetic/double-double.js";
import { atan2 } from "../arithmetic/elementary.js";
import type { PreparedScenario } from "../measure/run.js";
import type { PreciseState } from "./stepper.js";

/**
 * The angle of a position on the scale of `apsidalAngle`, less whole turns, rad: its longitude in the sense of
 * the motion, or the angle along the orbit from the ascending node (as in `measure/apsidal-angle.ts`).
 */
export function preciseDirection(
  kind: Exclude<PreparedScenario["apsidalAngle"], "polar">,
  sense: 1 | -1,
  state: PreciseState,
): DoubleDouble {
  if (kind === "longitude") {
    const longitude = atan2(state[1]!, state[0]!);
    return sense < 0 ? negate(longitude) : longitude;
  }
  const [x, y, z, vx, vy, vz] = state as [DoubleDouble, DoubleDouble, DoubleDouble, ...DoubleDouble[]];
  const cross = (a: DoubleDouble, b: DoubleDouble, c: DoubleDouble, d: DoubleDouble): DoubleDouble =>
    subtract(multiply(a, b), multiply(c, d));
  const lx = cross(y, vz!, z, vy!);
  const ly = cross(z, vx!, x, vz!);
  const lz = cross(x, vy!, y, vx!);
  const across = add(multiply(lx, lx), multiply(ly, ly));
  const size = sqrt(add(across, multiply(lz, lz)));
  const along = cross(lx, y, ly, x);
  const drop = multiply(lz, add(multiply(lx, x), multiply(ly, y)));
  // Both are longer than the position's parts by |L|: a common factor that the angle does not see.
  return atan2(subtract(multiply(across, z), drop), multiply(along, size));
}
