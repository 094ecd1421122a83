import { Decimal as Base } from "decimal.js";
import type { DoubleDouble } from "../../src/arithmetic/double-double.js";

/** decimal.js, an arbitrary-precision library, at 120 digits: the truth that double-double is held against. */
export const Decimal = Base.clone({ precision: 120, toExpNeg: -40, toExpPos: 40 });
export type Exact = InstanceType<typeof Decimal>;

/** u² with u = 2^-53: the unit of the published bounds. */
const U2 = 2 ** -106;

/** A double to all its bits; the library's own reading of a number takes its 17 printed digits. */
export function ofDouble(value: number): Exact {
  if (value === 0) return new Decimal(0);
  const exponent = Math.floor(Math.log2(Math.abs(value))) - 54;
  return new Decimal(2).pow(exponent).times(BigInt(value / 2 ** exponent).toString());
}

export const exactly = ({ high, low }: DoubleDouble): Exact => ofDouble(high).plus(ofDouble(low));

/** Relative error in units of u²; absolute where the truth is 0. */
export function errorInU2(found: DoubleDouble, truth: Exact): number {
  const off = exactly(found).minus(truth).abs();
  return (truth.isZero() ? off : off.div(truth.abs())).div(U2).toNumber();
}
