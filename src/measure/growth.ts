import { mean } from "simple-statistics";
import { fitLine } from "../statistics/line.js";

/** How a series of orbit means grows. */
export interface Growth {
  readonly kind: "none" | "linear" | "faster" | "random-walk";
  /** Change an orbit, as a straight line sees it. */
  readonly slope: number;
  /** Of |change| ~ orbits^exponent; null where nothing grows or too few orbits tell. */
  readonly exponent: number | null;
}

/** Fewer means than this leave no room for a model with four numbers and a scatter. */
const FEWEST_FOR_MODELS = 6;
/**
 * Between a steady drift (t^1) and the next law that rounding or truncation makes (Brouwer's t^3/2), and
 * again between t^1 and a random walk's t^1/2, the halves divide.
 */
const FASTER = 1.25;
/** A difference of 10 in the criterion is very strong evidence (Kass and Raftery, J. Am. Stat. Assoc. 90 (1995) 773). */
const VERY_STRONG = 10;
/** The von Neumann ratio is near 2 for scatter that forgets and near 0 for a smooth curve; 1 divides. */
const SMOOTH = 1;
/** A curve that leaves a tenth of the variance unexplained still goes by its power law. */
const EXPLAINED = 0.9;
/** Between a series that stays in its bounds (t^0) and a random walk (t^1/2) the half divides. */
const WALKS = 0.25;
/** Range of exponents searched, and how finely. */
const EXPONENTS = [0.1, 4] as const;
const RESOLUTION = 1e-4;

/**
 * Tells a steady drift, faster growth, a random walk and no growth apart, by the Bayesian information
 * criterion (G. Schwarz, Annals of Statistics 6 (1978) 461) over five models of the series m_k, k = 0, 1, …:
 *
 *   none    m = a + scatter
 *   line    m = a + b k + scatter
 *   power   m = a + b (k + 1/2)^p + scatter: the mean of an orbit stands for its middle
 *   walk    m_(k+1) - m_k = scatter
 *   pulled  m_(k+1) - m_k = b + scatter: a walk with a drift, such as uneven steps all one way
 *
 * Anything but no growth needs very strong evidence over it.
 *
 * A walk whose steps resemble their neighbours is no walk but a slow curve: a power law where that explains
 * it, a long swing otherwise.
 *
 * @param noise scatter below which nothing is told apart (rounding)
 */
export function growthOf(means: readonly number[], noise: number): Growth {
  const count = means.length;
  const orbit = means.map((_, k) => k);
  const line = fitLine(orbit, means);
  if (line === null) return { kind: "none", slope: 0, exponent: null };
  const slope = line.slope;
  if (count < FEWEST_FOR_MODELS) return { ...ofFew(means), slope };

  const floor = count * noise * noise + Number.MIN_VALUE;
  const criterion = (squares: number, numbers: number): number =>
    count * Math.log(Math.max(squares, floor) / count) + numbers * Math.log(count);
  const steps = means.slice(1).map((value, k) => value - means[k]!);
  const spread = squaresAbout(means, mean(means as number[]));
  const power = fitPower(means);
  const models = [
    { name: "none", value: criterion(spread, 2) },
    { name: "line", value: criterion(squaresOff(orbit, means), 3) },
    { name: "power", value: criterion(power.squares, 4) },
    // One step fewer than there are means; scaled to the same count.
    { name: "walk", value: criterion((squaresAbout(steps, 0) * count) / (count - 1), 1) },
    { name: "pulled", value: criterion((squaresAbout(steps, mean(steps)) * count) / (count - 1), 2) },
  ] as const;
  const byName = Object.fromEntries(models.map(({ name, value }) => [name, value]));
  const best = models.reduce((least, model) => (model.value < least.value ? model : least)).name;

  const curve = (): Growth =>
    (power.exponent ?? 0) >= FASTER && byName.line! - byName.power! > VERY_STRONG
      ? { kind: "faster", slope, exponent: power.exponent }
      : { kind: "linear", slope, exponent: power.exponent };
  const none = { kind: "none", slope, exponent: null } as const;
  if (byName.none! - byName[best]! <= VERY_STRONG) return none;
  if (best === "line" || best === "power") return curve();
  if (vonNeumannRatio(steps) < SMOOTH) return 1 - power.squares / spread >= EXPLAINED ? curve() : none;
  if (best === "pulled") return { kind: "linear", slope, exponent: power.exponent };
  const exponent = walkExponent(means);
  return exponent < WALKS ? none : { kind: "random-walk", slope, exponent };
}

/** Few means: a drift is one that never turns back. */
function ofFew(means: readonly number[]): Omit<Growth, "slope"> {
  const steps = means.slice(1).map((value, k) => value - means[k]!);
  const oneWay = steps.every((step) => step > 0) || steps.every((step) => step < 0);
  return { kind: oneWay ? "linear" : "none", exponent: null };
}

function squaresAbout(values: readonly number[], centre: number): number {
  return values.reduce((sum, value) => sum + (value - centre) ** 2, 0);
}

/** Sum of squares off the best straight line. */
function squaresOff(x: readonly number[], y: readonly number[]): number {
  const line = fitLine(x, y)!;
  return y.reduce((sum, value, i) => sum + (value - line.intercept - line.slope * x[i]!) ** 2, 0);
}

interface PowerFit {
  /** Null at the edge of the range searched. */
  readonly exponent: number | null;
  readonly squares: number;
}

/** Least squares over the exponent by golden section, over the rest by a line. */
function fitPower(means: readonly number[]): PowerFit {
  const squares = (exponent: number): number =>
    squaresOff(
      means.map((_, k) => (k + 0.5) ** exponent),
      means,
    );
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high]: [number, number] = [...EXPONENTS];
  while (high - low > RESOLUTION) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (squares(left) < squares(right)) high = right;
    else low = left;
  }
  const exponent = (low + high) / 2;
  const inside = exponent > EXPONENTS[0] + RESOLUTION && exponent < EXPONENTS[1] - RESOLUTION;
  return { exponent: inside ? exponent : null, squares: squares(exponent) };
}

/** J. von Neumann, Annals of Mathematical Statistics 12 (1941) 367: squared successive differences over squares. */
function vonNeumannRatio(values: readonly number[]): number {
  const steps = values.slice(1).map((value, i) => value - values[i]!);
  return squaresAbout(steps, 0) / squaresAbout(values, mean(values as number[]));
}

/** Slope of log rms change against log lag, over lags up to a quarter of the series. */
function walkExponent(means: readonly number[]): number {
  const lags: number[] = [];
  const sizes: number[] = [];
  for (let lag = 1; lag <= means.length / 4; lag *= 2) {
    const changes = means.slice(lag).map((value, i) => value - means[i]!);
    lags.push(Math.log(lag));
    sizes.push(Math.log(squaresAbout(changes, 0) / changes.length) / 2);
  }
  return fitLine(lags, sizes)?.slope ?? 0;
}
