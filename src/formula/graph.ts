import Fraction from "fraction.js";
import { exactDecimal } from "./decimal.js";
import { bits } from "./nearest-double.js";

/** Functions that a formula may call. Each can be differentiated. */
export const functionNames = [
  "sqrt",
  "sin",
  "cos",
  "tan",
  "asin",
  "acos",
  "atan",
  "exp",
  "log",
  "abs",
] as const;
export type FunctionName = (typeof functionNames)[number];

/**
 * Bits of the longest fraction that is kept exact, numerator and denominator together: room for the largest
 * and smallest doubles. Longer results stay operations, so that a short text cannot ask for endless digits.
 */
const LONGEST_FRACTION = 1200;

/** A node of an expression graph. Equal expressions of one graph are one node. */
export interface Node {
  readonly id: number;
  readonly op:
    | "number"
    | "symbol"
    | "add"
    | "subtract"
    | "multiply"
    | "divide"
    | "negate"
    | "power"
    | FunctionName;
  readonly args: readonly Node[];
  /** Exact value of a number; null otherwise. */
  readonly value: Fraction | null;
  /** Name of a symbol; null otherwise. */
  readonly name: string | null;
}

/** Larger whole powers go to the library's power function. */
const LARGEST_WHOLE_POWER = 32n;

/**
 * Builds expressions so that equal ones are shared. Simplifies only what is exact: numbers are folded as
 * fractions, zeros, ones and double signs disappear, and what rounds nothing - signs and small powers of two -
 * moves out of products and quotients to meet its like. Otherwise the operations are those of the text, in its
 * order.
 *
 * An expression times an exact zero is zero, though floating point would make it NaN where the expression
 * is infinite: a parameter folded to zero takes its whole term with it.
 */
export class Graph {
  readonly #nodes = new Map<string, Node>();
  readonly zero = this.number(0);
  readonly one = this.number(1);

  #intern(
    op: Node["op"],
    args: readonly Node[],
    value: Fraction | null = null,
    name: string | null = null,
  ): Node {
    const ids = args.map((argument) => argument.id);
    // Sums and products are the same bits either way round.
    if (op === "add" || op === "multiply") ids.sort((one, other) => one - other);
    const key = `${op} ${value?.toFraction() ?? name ?? ids.join()}`;
    let node = this.#nodes.get(key);
    if (node === undefined) {
      node = { id: this.#nodes.size, op, args, value, name };
      this.#nodes.set(key, node);
    }
    return node;
  }

  get size(): number {
    return this.#nodes.size;
  }

  /** The exact result of an operation on two numbers, unless it is too long. */
  #folded(a: Node, b: Node, operation: (x: Fraction, y: Fraction) => Fraction): Node | null {
    if (a.value === null || b.value === null) return null;
    const result = operation(a.value, b.value);
    return bits(result.n) + bits(result.d) > LONGEST_FRACTION ? null : this.number(result);
  }

  /** @param value a whole number, a decimal as text such as "0.1" or "1e-3" */
  number(value: number | string | Fraction): Node {
    return this.#intern("number", [], typeof value === "string" ? exactDecimal(value) : new Fraction(value));
  }

  symbol(name: string): Node {
    return this.#intern("symbol", [], null, name);
  }

  add(a: Node, b: Node): Node {
    const exact = this.#folded(a, b, (x, y) => x.add(y));
    if (exact !== null) return exact;
    if (a === this.zero) return b;
    if (b === this.zero) return a;
    if (b.op === "negate") return this.subtract(a, b.args[0]!);
    if (a.op === "negate") return this.subtract(b, a.args[0]!);
    if (a === b) return this.multiply(this.number(2), a);
    return this.#intern("add", [a, b]);
  }

  subtract(a: Node, b: Node): Node {
    const exact = this.#folded(a, b, (x, y) => x.sub(y));
    if (exact !== null) return exact;
    if (b === this.zero) return a;
    if (a === this.zero) return this.negate(b);
    if (a === b) return this.zero;
    if (b.op === "negate") return this.add(a, b.args[0]!);
    if (a.op === "negate") return this.negate(this.add(a.args[0]!, b));
    return this.#intern("subtract", [a, b]);
  }

  multiply(a: Node, b: Node): Node {
    const exact = this.#folded(a, b, (x, y) => x.mul(y));
    if (exact !== null) return exact;
    if (a === this.zero || b === this.zero) return this.zero;
    if (a === this.one) return b;
    if (b === this.one) return a;
    if (a.op === "negate") return this.negate(this.multiply(a.args[0]!, b));
    if (b.op === "negate") return this.negate(this.multiply(a, b.args[0]!));
    const [p, x] = this.#scaled(a);
    const [q, y] = this.#scaled(b);
    const scale = p.mul(q);
    if ((x === a && y === b) || !isSmallPowerOfTwo(scale)) return this.#intern("multiply", [a, b]);
    const product = this.multiply(x, y);
    return scale.equals(1) ? product : this.#intern("multiply", [this.number(scale), product]);
  }

  divide(a: Node, b: Node): Node {
    const exact = b === this.zero ? null : this.#folded(a, b, (x, y) => x.div(y));
    if (exact !== null) return exact;
    if (a === this.zero && b !== this.zero) return this.zero;
    if (b === this.one) return a;
    if (a.op === "negate") return this.negate(this.divide(a.args[0]!, b));
    if (b.op === "negate") return this.negate(this.divide(a, b.args[0]!));
    const [p, x] = this.#scaled(a);
    const [q, y] = this.#scaled(b);
    const scale = p.div(q);
    if ((x === a && y === b) || !isSmallPowerOfTwo(scale)) return this.#intern("divide", [a, b]);
    return this.multiply(this.number(scale), this.divide(x, y));
  }

  /** A node as a power of two times the rest. */
  #scaled(node: Node): readonly [Fraction, Node] {
    if (node.value !== null && isSmallPowerOfTwo(node.value)) return [node.value, this.one];
    const [factor, rest] = node.op === "multiply" ? (node.args as [Node, Node]) : [node, node];
    if (rest !== node && factor.value !== null && isSmallPowerOfTwo(factor.value))
      return [factor.value, rest];
    return [ONE, node];
  }

  negate(a: Node): Node {
    if (a.value) return this.number(a.value.neg());
    if (a.op === "negate") return a.args[0]!;
    return this.#intern("negate", [a]);
  }

  /** Whole powers by repeated multiplication, half ones with a square root, negative ones by one division. */
  power(base: Node, exponent: Node): Node {
    const p = exponent.value;
    if (p === null) return this.#intern("power", [base, exponent]);
    if (p.compare(0) < 0) return this.divide(this.one, this.power(base, this.number(p.neg())));
    const doubled = p.mul(2);
    if (doubled.d !== 1n || doubled.n > 2n * LARGEST_WHOLE_POWER)
      return this.#intern("power", [base, exponent]);
    const whole = this.#wholePower(base, Number(doubled.n / 2n));
    return doubled.n % 2n === 0n ? whole : this.multiply(whole, this.call("sqrt", base));
  }

  #wholePower(base: Node, n: number): Node {
    if (n === 0) return this.one;
    if (n === 1) return base;
    const half = this.#wholePower(base, n >> 1);
    const square = this.multiply(half, half);
    return n % 2 === 1 ? this.multiply(square, base) : square;
  }

  call(name: FunctionName, argument: Node): Node {
    if (name === "sqrt" && (argument === this.zero || argument === this.one)) return argument;
    return this.#intern(name, [argument]);
  }

  /** The same operation on other arguments. */
  rebuild(node: Node, args: readonly Node[]): Node {
    const [a, b] = args as [Node, Node];
    switch (node.op) {
      case "number":
      case "symbol":
        return node;
      case "add":
        return this.add(a, b);
      case "subtract":
        return this.subtract(a, b);
      case "multiply":
        return this.multiply(a, b);
      case "divide":
        return this.divide(a, b);
      case "negate":
        return this.negate(a);
      case "power":
        return this.power(a, b);
      default:
        return this.call(node.op, a);
    }
  }
}

const ONE = new Fraction(1);

/** Powers up to this go where they may: beyond, a product could overflow that as written would not. */
const LARGEST_POWER_OF_TWO = 1n << 64n;

function isSmallPowerOfTwo({ n, d, s }: Fraction): boolean {
  const whole = n > d ? n : d;
  return s > 0n && n > 0n && (n & (n - 1n)) === 0n && (d & (d - 1n)) === 0n && whole <= LARGEST_POWER_OF_TWO;
}
