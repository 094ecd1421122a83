import {
  type Code,
  type Condition,
  type Expression,
  isCounter,
  type Operation,
  type Statement,
} from "../code.js";
import { unsigned } from "./bytes.js";
import {
  anyTrue,
  control,
  extractLane,
  fromInteger,
  type Instructions,
  integer,
  one,
  replaceLane,
  splat,
} from "./instructions.js";

/** The body of a function of `$step` and `#steps`, and the functions of the mathematical library that it calls. */
export interface EncodedFunction {
  readonly bytes: readonly number[];
  /** By their index, with the number of doubles that they take. */
  readonly imports: readonly Import[];
}

export interface Import {
  readonly op: Operation["op"];
  readonly takes: number;
}

/**
 * Encodes code for one run, or for two side by side.
 *
 * @param parametersAt where the parameters begin in memory, in bytes; `io` begins at 0
 */
export function encodeFunction(code: Code, set: Instructions, parametersAt: number): EncodedFunction {
  const encoder = new Encoder(set, parametersAt, namesOf(code));
  encoder.code(code);
  // Not reached: the code returns before.
  encoder.end();
  return encoder;
}

const isShared = (value: Expression): boolean => typeof value === "string" && value.startsWith("$");
const ARGUMENTS = ["$step", "#steps"];

function namesOf(code: Code): Set<string> {
  const names = new Set<string>();
  for (const statement of code.statements) {
    if ("name" in statement) names.add(statement.name);
    if ("body" in statement) for (const name of namesOf(statement.body)) names.add(name);
  }
  return names;
}

class Encoder {
  readonly imports: Import[] = [];
  readonly bytes: number[] = [];
  readonly #set: Instructions;
  readonly #parametersAt: number;
  readonly #local: ReadonlyMap<string, number>;
  /** Labels open at this place, and those that a `leave` goes to. */
  #depth = 0;
  readonly #exits: number[] = [];

  constructor(set: Instructions, parametersAt: number, names: ReadonlySet<string>) {
    this.#set = set;
    this.#parametersAt = parametersAt;
    const counters = [...names].filter(isCounter);
    const own = [...names].filter((name) => !isCounter(name));
    this.#local = new Map([...ARGUMENTS, ...counters, ...own].map((name, i) => [name, i]));
    this.#put([2]);
    this.#put([...unsigned(counters.length), integer.valueType]);
    this.#put([...unsigned(own.length), set.valueType]);
  }

  code(code: Code): void {
    for (const statement of code.statements) this.#statement(statement);
  }

  end(): void {
    this.#put(control.unreachable);
    this.#put(control.end);
  }

  #put(bytes: readonly number[]): void {
    for (const byte of bytes) this.bytes.push(byte);
  }

  #statement(statement: Statement): void {
    switch (statement.do) {
      case "define":
      case "variable":
      case "set":
        this.#value(statement.value, isCounter(statement.name) ? integer : this.#set);
        this.#put(control.set(this.#local.get(statement.name)!));
        return;
      case "store":
        this.#put(control.base);
        this.#value(statement.value, this.#set);
        this.#put(this.#set.store(statement.index * this.#set.size));
        return;
      case "loop":
        this.#loop(statement.body);
        return;
      case "when":
        this.#truth(statement.condition);
        this.#put(control.if);
        this.#within(statement.body);
        this.#put(control.end);
        return;
      case "leave":
        this.#put(control.branch(this.#depth - this.#exits.at(-1)!));
        return;
      case "return":
        this.#value(statement.value, integer);
        this.#put(control.return);
    }
  }

  /** A block to leave to, and in it the loop that goes back to its own beginning. */
  #loop(body: Code): void {
    this.#put(control.block);
    this.#put(control.loop);
    this.#depth++;
    this.#exits.push(this.#depth);
    this.#within(body);
    this.#exits.pop();
    this.#depth--;
    this.#put(control.branch(0));
    this.#put(control.end);
    this.#put(control.end);
  }

  #within(body: Code): void {
    this.#depth++;
    this.code(body);
    this.#depth--;
  }

  #value(value: Expression, set: Instructions): void {
    if (typeof value === "number") {
      this.#put(set.constant(value));
    } else if (typeof value === "string") {
      this.#name(value, set);
    } else if ("high" in value) {
      this.#put(set.constant(value.high));
    } else if ("from" in value) {
      const begin = value.from === "io" ? 0 : this.#parametersAt;
      this.#put(control.base);
      this.#put(set.load(begin + value.index * set.size));
    } else {
      const operation = set.operations[value.op];
      if (operation === undefined) {
        this.#call(value, set);
      } else {
        for (const argument of value.args) this.#value(argument, set);
        this.#put(operation);
      }
    }
  }

  #name(name: string, set: Instructions): void {
    this.#put(control.get(this.#local.get(name)!));
    if (isCounter(name) && set !== integer) this.#put(fromInteger);
    if (set.lanes === 2 && (isCounter(name) || isShared(name))) this.#put(splat);
  }

  /** A function of the library, once for each run. */
  #call({ op, args }: Operation, set: Instructions): void {
    let index = this.imports.findIndex((known) => known.op === op);
    if (index < 0) index = this.imports.push({ op, takes: args.length }) - 1;
    for (let lane = 0; lane < set.lanes; lane++) {
      for (const argument of args) {
        this.#value(argument, set);
        if (set.lanes === 2) this.#put(extractLane(lane));
      }
      this.#put(control.call(index));
      if (set.lanes === 2) this.#put(lane === 0 ? splat : replaceLane(lane));
    }
  }

  /** Whether a condition holds: of runs side by side, for any. */
  #truth(condition: Condition): void {
    if ("either" in condition) {
      for (const part of condition.either) this.#truth(part);
      this.#put(one.either);
    } else if ("compare" in condition && condition.args.some(isCounter)) {
      this.#mask(condition, integer);
    } else {
      this.#mask(condition, this.#set);
      if (this.#set.lanes === 2) this.#put(anyTrue);
    }
  }

  /** Truth of each run. */
  #mask(condition: Condition, set: Instructions): void {
    if ("compare" in condition) {
      for (const argument of condition.args) this.#value(argument, set);
      this.#put(set.comparisons[condition.compare]);
      return;
    }
    for (const part of "both" in condition ? condition.both : condition.either) this.#mask(part, set);
    this.#put("both" in condition ? set.both : set.either);
  }
}
