import {
  add,
  type DoubleDouble,
  divide,
  fromDouble,
  multiply,
  negate,
  ONE,
  scale,
  shift,
  sqrt,
  subtract,
  ZERO,
} from "../arithmetic/double-double.js";
import { exp, turn } from "../arithmetic/elementary.js";
import { type ExactOrbit, integrateOrbit, type RadialMotion } from "./radial-quadrature.js";
import { schwarzschildAdvance } from "./schwarzschild.js";

type Parameters = Readonly<Record<string, DoubleDouble>>;
type State = readonly DoubleDouble[];

/**
 * The exact apsidal advance and radial period of an orbit that starts at periapsis, without stepping: for
 * newtonian and newtonian-angle, schwarzschild-angle, post-newtonian-1, and oblate in the plane of its equator.
 *
 * @param parameters by claim name
 * @param state in the order of the equations: x, y, where given z, and their rates; or u and u'
 * @returns null for any other equations or start
 */
export function exactOrbit(equations: string, parameters: Parameters, state: State): ExactOrbit | null {
  switch (equations) {
    case "newtonian-angle":
      return { advance: ZERO, period: turn, bound: 0 };
    case "schwarzschild-angle":
      return schwarzschildAdvance(parameters, state);
    case "newtonian": {
      const planar = periapsisOf(state);
      return planar && { ...integrateOrbit(central(planar, [parameters.GM!]))!, advance: ZERO };
    }
    case "oblate": {
      const planar = periapsisOf(state);
      const pulledOut = (parameters.J3 ?? ZERO).high !== 0 || !inEquator(state);
      if (planar === null || pulledOut) return null;
      return integrateOrbit(central(planar, equatorial(parameters)));
    }
    case "post-newtonian-1": {
      const planar = periapsisOf(state);
      return planar && integrateOrbit(postNewtonian(planar, parameters));
    }
    default:
      return null;
  }
}

interface Periapsis {
  readonly u: DoubleDouble;
  readonly h: DoubleDouble;
}

/** u and h of a start, in a plane or in space, with the velocity exactly across the radius. */
function periapsisOf(state: State): Periapsis | null {
  const half = state.length / 2;
  const [place, velocity] = [state.slice(0, half), state.slice(half)];
  const radial = dot(place, velocity);
  if (radial.high !== 0) return null;
  const radius = sqrt(dot(place, place));
  // The angle counts along the motion, whichever way it goes.
  return { u: divide(ONE, radius), h: multiply(radius, sqrt(dot(velocity, velocity))) };
}

const dot = (x: State, y: State): DoubleDouble =>
  x.reduce((sum, value, i) => add(sum, multiply(value, y[i]!)), ZERO);

const inEquator = (state: State): boolean =>
  state.length === 4 || (state[2]!.high === 0 && state[5]!.high === 0);

/** GM u + ... of the negative potential of an oblate body in its equator: coefficients of u, u³, u⁵. */
function equatorial({ GM, R, J2, J4 }: Parameters): DoubleDouble[] {
  const R2 = multiply(R!, R!);
  // P2(0) = -1/2 and P4(0) = 3/8.
  const second = shift(multiply(multiply(GM!, J2!), R2), 0.5);
  const fourth = scale(multiply(multiply(GM!, J4 ?? ZERO), multiply(R2, R2)), -3 / 8);
  return [GM!, second, fourth];
}

/**
 * A central potential -Σ c_k u^(2k+1): (dr/dt)² = 2 Σ c_k (u^(2k+1) - u0^(2k+1)) - h² (u² - u0²), in powers of
 * s = u - u0.
 */
function central({ u, h }: Periapsis, coefficients: readonly DoubleDouble[]): RadialMotion {
  const series: DoubleDouble[] = Array.from({ length: 2 * coefficients.length + 1 }, () => ZERO);
  const put = (factor: DoubleDouble, power: number): void => {
    // The binomial theorem, without its first term.
    let term = factor;
    for (let j = 1; j <= power; j++) {
      term = divide(scale(term, power - j + 1), fromDouble(j));
      let whole = term;
      for (let i = 0; i < power - j; i++) whole = multiply(whole, u);
      series[j] = add(series[j]!, whole);
    }
  };
  for (const [k, c] of coefficients.entries()) put(shift(c, 2), 2 * k + 1);
  put(negate(multiply(h, h)), 2);
  return { start: u, rateSquared: series, arealVelocity: () => h };
}

/** Powers of s that are kept: each is smaller than the last by the strength of the field, at most some hundredths. */
const TERMS = 40;

/**
 * The post-Newtonian motion. From the acceleration, with k = 1/c², μ = GM and ν the symmetric mass ratio,
 * dh/dr = (μ/r²) k (4 - 2ν) h, so that h = h0 exp(-λ s) with λ = k (4 - 2ν) μ; and w = v² obeys
 * dw/du = 2μ - 2k (4 + 2ν) μ² u - k μ (6 - 7ν) w + 3 k μ ν h² u², a linear equation that a power series solves.
 */
function postNewtonian({ u, h }: Periapsis, { GM, c, "mass-ratio": ratio }: Parameters): RadialMotion {
  const nu = ratio ?? ZERO;
  const strength = divide(GM!, multiply(c!, c!));
  const lambda = multiply(strength, subtract(fromDouble(4), scale(nu, 2)));
  const decay = multiply(strength, subtract(fromDouble(6), scale(nu, 7)));
  const drive = scale(multiply(strength, nu), 3);
  const h2 = multiply(h, h);
  const u2 = multiply(u, u);
  // h² u² = h0² exp(-2λ s) (u0 + s)².
  const shrinking: DoubleDouble[] = [ONE];
  for (let j = 1; j <= TERMS; j++) {
    shrinking.push(divide(multiply(shrinking[j - 1]!, scale(lambda, -2)), fromDouble(j)));
  }
  const at = (j: number): DoubleDouble => shrinking[j] ?? ZERO;
  const across = shrinking.map((_, j) =>
    multiply(h2, add(add(multiply(u2, at(j)), multiply(scale(u, 2), at(j - 1))), at(j - 2))),
  );
  const falling = scale(multiply(multiply(strength, GM!), add(fromDouble(4), scale(nu, 2))), 2);
  const w: DoubleDouble[] = [across[0]!];
  for (let j = 0; j < TERMS; j++) {
    let force = subtract(multiply(drive, across[j]!), multiply(decay, w[j]!));
    if (j === 0) force = add(force, subtract(scale(GM!, 2), multiply(falling, u)));
    if (j === 1) force = subtract(force, falling);
    w.push(divide(force, fromDouble(j + 1)));
  }
  return {
    start: u,
    rateSquared: w.map((value, j) => (j === 0 ? ZERO : subtract(value, across[j]!))),
    arealVelocity: (s) => multiply(h, exp(negate(multiply(lambda, s)))),
  };
}
