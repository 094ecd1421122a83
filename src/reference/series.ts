import type { DoubleDouble } from "../arithmetic/double-double.js";

/** 2^27 + 1 cuts a significand in two halves, whose products are exact. */
const CUT = 134_217_729;

/**
 * Coefficients of truncated power series in double-double, one series a slot; operations write the k-th
 * coefficient of one from those of others. Each high part is kept in its two halves besides (Veltkamp), so that
 * products cost no splitting. Written out in doubles for speed: the algorithms are those of
 * `arithmetic/double-word.ts`.
 */
export class SeriesTable {
  readonly #high: Float64Array;
  readonly #low: Float64Array;
  readonly #upper: Float64Array;
  readonly #lower: Float64Array;
  readonly #stride: number;
  /** The result of the last sum or product. */
  readonly #result = new Float64Array(2);

  /** @param order the highest power kept */
  constructor(slots: number, order: number) {
    this.#stride = order + 1;
    const size = slots * this.#stride;
    this.#high = new Float64Array(size);
    this.#low = new Float64Array(size);
    this.#upper = new Float64Array(size);
    this.#lower = new Float64Array(size);
  }

  set(slot: number, k: number, { high, low }: DoubleDouble): void {
    this.#put(slot * this.#stride + k, high, low);
  }

  get(slot: number, k: number): DoubleDouble {
    const i = slot * this.#stride + k;
    return { high: this.#high[i]!, low: this.#low[i]! };
  }

  size(slot: number, k: number): number {
    return Math.abs(this.#high[slot * this.#stride + k]!);
  }

  #put(i: number, high: number, low: number): void {
    const shifted = CUT * high;
    const upper = shifted - (shifted - high);
    this.#high[i] = high;
    this.#low[i] = low;
    this.#upper[i] = upper;
    this.#lower[i] = high - upper;
  }

  /** own_k = a_k + b_k, or less b_k where `sign` is -1. */
  sum(own: number, k: number, a: number, b: number, sign: 1 | -1): void {
    const i = a * this.#stride + k;
    const j = b * this.#stride + k;
    this.#add(this.#high[i]!, this.#low[i]!, sign * this.#high[j]!, sign * this.#low[j]!);
    this.#put(own * this.#stride + k, this.#result[0]!, this.#result[1]!);
  }

  /** own_k = a_k b_0: of a series that does not change times one that does. */
  scaled(own: number, k: number, a: number, b: number): void {
    this.#product(a, b, k, k, k);
    this.#put(own * this.#stride + k, this.#result[0]!, this.#result[1]!);
  }

  /** own_k = Σ a_j b_(k-j). */
  multiply(own: number, k: number, a: number, b: number): void {
    this.#product(a, b, k, 0, k);
    this.#put(own * this.#stride + k, this.#result[0]!, this.#result[1]!);
  }

  /** own_k = Σ a_j a_(k-j), each product of two different coefficients once. */
  square(own: number, k: number, a: number): void {
    let high = 0;
    let low = 0;
    if (k > 0) {
      this.#product(a, a, k, 0, Math.ceil(k / 2) - 1);
      high = 2 * this.#result[0]!;
      low = 2 * this.#result[1]!;
    }
    if (k % 2 === 0) {
      this.#product(a, a, k, k / 2, k / 2);
      this.#add(high, low, this.#result[0]!, this.#result[1]!);
      high = this.#result[0]!;
      low = this.#result[1]!;
    }
    this.#put(own * this.#stride + k, high, low);
  }

  /** Coefficient of a quotient: own_k = (a_k - Σ_(j<k) own_j b_(k-j)) / b_0. */
  divide(own: number, k: number, a: number, b: number): void {
    this.#rest(a, k, own, b, 0, k - 1);
    this.#over(own, k, this.#high[b * this.#stride]!, this.#low[b * this.#stride]!);
  }

  /** Coefficient of a root, k > 0: own_k = (a_k - Σ_(0<j<k) own_j own_(k-j)) / (2 own_0). */
  root(own: number, k: number, a: number): void {
    this.#rest(a, k, own, own, 1, k - 1);
    this.#over(own, k, 2 * this.#high[own * this.#stride]!, 2 * this.#low[own * this.#stride]!);
  }

  /** Σ w(j) a_j b_(k-j) over j from `first` to `last`, with whole weights w(j) = base + slope j. */
  weighted(
    a: number,
    b: number,
    k: number,
    first: number,
    last: number,
    base: number,
    slope: number,
  ): DoubleDouble {
    this.#product(a, b, k, first, last, base, slope);
    return { high: this.#result[0]!, low: this.#result[1]! };
  }

  /** own_(k+1) = a_k b_(k+1), with reciprocals in b: the coefficient of an integral. */
  integrate(own: number, k: number, a: number, b: number): void {
    this.#product(a, b, 2 * k + 1, k, k);
    this.#put(own * this.#stride + k + 1, this.#result[0]!, this.#result[1]!);
  }

  /** The sum of a series at x, by Horner's scheme. */
  evaluate(slot: number, { high: x, low: xLow }: DoubleDouble): DoubleDouble {
    const shiftedX = CUT * x;
    const x1 = shiftedX - (shiftedX - x);
    const x2 = x - x1;
    const first = slot * this.#stride;
    let high = 0;
    let low = 0;
    for (let i = first + this.#stride - 1; i >= first; i--) {
      const p = high * x;
      const shifted = CUT * high;
      const h1 = shifted - (shifted - high);
      const h2 = high - h1;
      const e = h1 * x1 - p + h1 * x2 + h2 * x1 + h2 * x2 + (high * xLow + low * x);
      const product = p + e;
      this.#add(product, e - (product - p), this.#high[i]!, this.#low[i]!);
      high = this.#result[0]!;
      low = this.#result[1]!;
    }
    return { high, low };
  }

  /** a_k less a sum of products. */
  #rest(a: number, k: number, x: number, y: number, first: number, last: number): void {
    const i = a * this.#stride + k;
    this.#product(x, y, k, first, last);
    this.#add(this.#high[i]!, this.#low[i]!, -this.#result[0]!, -this.#result[1]!);
  }

  /** Joldes, Muller and Popescu's algorithm 6. */
  #add(xHigh: number, xLow: number, yHigh: number, yLow: number): void {
    const s = xHigh + yHigh;
    const sy = s - xHigh;
    const se = xHigh - (s - sy) + (yHigh - sy);
    const t = xLow + yLow;
    const ty = t - xLow;
    const te = xLow - (t - ty) + (yLow - ty);
    const c = se + t;
    const v = s + c;
    const w = te + (c - (v - s));
    const high = v + w;
    this.#result[0] = high;
    this.#result[1] = w - (high - v);
  }

  /** own_k = the last result over a number: algorithm 17. */
  #over(own: number, k: number, yHigh: number, yLow: number): void {
    const xHigh = this.#result[0]!;
    const xLow = this.#result[1]!;
    const q = xHigh / yHigh;
    const c = yHigh * q;
    const shiftedY = CUT * yHigh;
    const y1 = shiftedY - (shiftedY - yHigh);
    const y2 = yHigh - y1;
    const shiftedQ = CUT * q;
    const q1 = shiftedQ - (shiftedQ - q);
    const q2 = q - q1;
    const ce = y1 * q1 - c + y1 * q2 + y2 * q1 + y2 * q2;
    const cross = yLow * q;
    const t = c + cross;
    const te = cross - (t - c) + ce;
    const r = t + te;
    const re = te - (r - t);
    const rest = (xHigh - r + (xLow - re)) / yHigh;
    const high = q + rest;
    this.#put(own * this.#stride + k, high, rest - (high - q));
  }

  /** The sum of products, within some 2 u² of the sum of their sizes, u = 2^-53; nothing gives 0. */
  #product(a: number, b: number, k: number, first: number, last: number, base = 1, slope = 0): void {
    const high = this.#high;
    const low = this.#low;
    const upper = this.#upper;
    const lower = this.#lower;
    let sum = 0;
    let rest = 0;
    let i = a * this.#stride + first;
    let other = b * this.#stride + k - first;
    for (let j = first; j <= last; j++, i++, other--) {
      const x = high[i]!;
      const y = high[other]!;
      const x1 = upper[i]!;
      const x2 = lower[i]!;
      const y1 = upper[other]!;
      const y2 = lower[other]!;
      let p = x * y;
      let e = x1 * y1 - p + x1 * y2 + x2 * y1 + x2 * y2 + (x * low[other]! + low[i]! * y);
      const weight = base + slope * j;
      if (weight !== 1) {
        // A whole number of few bits: the halves of the product times it are exact.
        const shifted = CUT * p;
        const top = shifted - (shifted - p);
        const wp = weight * p;
        e = weight * e + (weight * top - wp + weight * (p - top));
        p = wp;
      }
      const s = sum + p;
      const share = s - sum;
      rest += sum - (s - share) + (p - share) + e;
      sum = s;
    }
    const total = sum + rest;
    this.#result[0] = total;
    this.#result[1] = rest - (total - sum);
  }
}
