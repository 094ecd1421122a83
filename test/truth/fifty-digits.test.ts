import { Decimal } from "decimal.js";
import { expect, it } from "vitest";
import { type DoubleDouble, fromDouble } from "../../src/arithmetic/double-double.js";
import { exactOrbit } from "../../src/truth/exact-orbit.js";

/*
 * The same integrals in decimal arithmetic of 60 digits by other ways: the elliptic integral by the
 * arithmetic-geometric mean, the speed of the post-Newtonian orbit in closed form instead of a power series, its
 * turning points by bisection, and the roots divided out in plain arithmetic, which 60 digits afford.
 */
const D = Decimal.clone({ precision: 60 });
type Real = InstanceType<typeof D>;
const PI = D.acos(-1);
/** A double exactly: the constructor would take its shortest decimal. */
function real(value: number): Real {
  let halvings = 0;
  for (; !Number.isInteger(value); halvings++) value *= 2;
  return new D(BigInt(value).toString()).div(new D(2).pow(halvings));
}
const whole = ({ high, low }: DoubleDouble): Real => real(high).add(real(low));
const partOf = (found: DoubleDouble, exact: Real, scale: Real): number =>
  whole(found).sub(exact).div(scale).abs().toNumber();

const LIMIT = 1e-26;

it.each([
  [40, 0.2],
  [40, 0.95],
  [9, 0.6],
  [1e8, 0.2],
])("schwarzschild-angle from p = %d GM/c² at e = %d", (p, e) => {
  const K = (1 - (3 + e * e) / p) / p;
  const u2 = (1 + e) / p;
  const orbit = exactOrbit(
    "schwarzschild-angle",
    { GM: fromDouble(1), c: fromDouble(1), "inverse-semi-latus-rectum": fromDouble(K) },
    [fromDouble(u2), fromDouble(0)],
  )!;
  // The other roots of 2u³ - u² + 2Ku + constant: 2u² - (1 - 2u2) u + 2K - u2 (1 - 2u2).
  const b = new D(1).sub(real(u2).mul(2));
  const product = real(K)
    .mul(2)
    .sub(b.mul(real(u2)));
  const root = b.mul(b).sub(product.mul(8)).sqrt();
  const u1 = b.sub(root).div(4);
  const u3 = b.add(root).div(4);
  // K(m) = π/(2 AGM(1, sqrt(1 - m))) (M. Abramowitz and I. Stegun, 17.6.3).
  let [x, y] = [new D(1), new D(1).sub(real(u2).sub(u1).div(u3.sub(u1))).sqrt()];
  for (let k = 0; k < 12; k++) [x, y] = [x.add(y).div(2), x.mul(y).sqrt()];
  const swept = PI.mul(2).div(x.mul(u3.sub(u1).mul(2).sqrt()));
  expect(partOf(orbit.period, swept, swept)).toBeLessThan(LIMIT);
  const off = partOf(orbit.advance, swept.sub(PI.mul(2)), PI.mul(2));
  expect(off).toBeLessThan(LIMIT);
  expect(off).toBeLessThanOrEqual(orbit.bound);
});

/** Integrals of the post-Newtonian orbit of GM = 1 from u0 at the rate h0, with k = 1/c². */
function postNewtonian(u0: Real, h0: Real, k: Real, nu: Real): { angle: Real; time: Real } {
  const lambda = k.mul(new D(4).sub(nu.mul(2)));
  const kappa = k.mul(new D(6).sub(nu.mul(7)));
  const h = (u: Real): Real => h0.mul(lambda.neg().mul(u.sub(u0)).exp());
  // dw/du = 2 - 2k (4 + 2ν) u - κ w + 3kν h² u² is solved by A exp(-κ u) + B + C u + h² (a + b u + c u²).
  const fall = k.mul(2).mul(new D(4).add(nu.mul(2)));
  const C = fall.neg().div(kappa);
  const B = new D(2).sub(C).div(kappa);
  const delta = kappa.sub(lambda.mul(2));
  const c = k.mul(3).mul(nu).div(delta);
  const b = c.mul(-2).div(delta);
  const a = b.neg().div(delta);
  const particular = (u: Real): Real =>
    B.add(C.mul(u)).add(
      h(u)
        .pow(2)
        .mul(a.add(b.mul(u)).add(c.mul(u).mul(u))),
    );
  const A = h0.mul(u0).pow(2).sub(particular(u0));
  const f = (u: Real): Real =>
    A.mul(kappa.neg().mul(u.sub(u0)).exp())
      .add(particular(u))
      .sub(h(u).mul(u).pow(2));
  let [low, high] = [u0.mul("1e-5"), u0.mul("0.98")];
  expect(f(low).isNegative()).toBe(true);
  expect(f(high).isPositive()).toBe(true);
  for (let k = 0; k < 190; k++) {
    const middle = low.add(high).div(2);
    if (f(middle).isNegative()) low = middle;
    else high = middle;
  }
  // Enough for u of a hundredfold range; the sum over fewer is off by more than the limit.
  const nodes = low.mul(20).lt(u0) ? 512 : 128;
  let [angle, time] = [new D(0), new D(0)];
  for (let k = 0; k < nodes; k++) {
    const theta = PI.mul(2 * k + 1).div(2 * nodes);
    const u = low.add(u0).div(2).add(u0.sub(low).div(2).mul(theta.cos()));
    const rest = f(u)
      .div(u0.sub(u).mul(u.sub(low)))
      .sqrt();
    angle = angle.add(h(u).div(rest));
    time = time.add(new D(1).div(u.mul(u).mul(rest)));
  }
  return { angle: angle.mul(PI.mul(2).div(nodes)), time: time.mul(PI.mul(2).div(nodes)) };
}

it.each([
  [0, 0.01, 0.4],
  [0.1, 0.01, 0.4],
  [0.25, 0.02, 0.3],
  [0.25, 1e-4, 0.6],
  // Far out and barely bound: the second turn is near infinity.
  [0.2, 0.01, 0.9],
])("post-newtonian-1 at mass ratio %d, GM/(c² r) = %d, e = %d", (nu, k, e) => {
  const c = 1 / Math.sqrt(k);
  const speed = Math.sqrt(1 + e);
  const orbit = exactOrbit(
    "post-newtonian-1",
    { GM: fromDouble(1), c: fromDouble(c), "mass-ratio": fromDouble(nu) },
    [1, 0, 0, speed].map(fromDouble),
  )!;
  const exact = postNewtonian(new D(1), real(speed), real(c).pow(-2), real(nu));
  const off = partOf(orbit.advance, exact.angle.sub(PI.mul(2)), PI.mul(2));
  expect(off).toBeLessThan(LIMIT);
  expect(off).toBeLessThanOrEqual(orbit.bound);
  expect(partOf(orbit.period, exact.time, exact.time)).toBeLessThanOrEqual(Math.min(LIMIT, orbit.bound));
});
