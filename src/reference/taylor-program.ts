import type { DoubleDouble } from "../arithmetic/double-double.js";
import type { Graph, Node } from "../formula/graph.js";
import { inOrder, mentions } from "../formula/walk.js";
import { preciseValue } from "../kernel/constants.js";
import type { CompiledSystem } from "../kernel/system.js";
import { type Recurrence, recurrence } from "./recurrences.js";

/** How the series of a system's accelerations follow from those of its states. */
export interface TaylorProgram {
  readonly slots: number;
  /** Slots of the states in their order, and of their accelerations. */
  readonly states: readonly number[];
  readonly accelerations: readonly number[];
  /** Values that do not change, set once. */
  constants(parameters: readonly DoubleDouble[]): readonly (readonly [slot: number, value: DoubleDouble])[];
  /** In the order in which they are computed. */
  readonly recurrences: readonly Recurrence[];
}

/** Rewrites what has no recurrence of its own: a tangent, and a power whose exponent changes. */
function rewritten(graph: Graph, node: Node, changes: (node: Node) => boolean): Node {
  if (node.op === "tan") {
    return graph.divide(graph.call("sin", node.args[0]!), graph.call("cos", node.args[0]!));
  }
  if (node.op === "power" && changes(node.args[1]!)) {
    return graph.call("exp", graph.multiply(node.args[1]!, graph.call("log", node.args[0]!)));
  }
  return node;
}

/** What the recurrence of a node needs beside its arguments. */
function companionOf(graph: Graph, { op, args: [a] }: Node): Node | null {
  const square = (): Node => graph.multiply(a!, a!);
  switch (op) {
    case "sin":
      return graph.call("cos", a!);
    case "cos":
      return graph.call("sin", a!);
    case "atan":
      return graph.add(graph.one, square());
    case "asin":
      return graph.call("sqrt", graph.subtract(graph.one, square()));
    case "acos":
      return graph.negate(graph.call("sqrt", graph.subtract(graph.one, square())));
    default:
      return null;
  }
}

export function taylorProgram(system: CompiledSystem): TaylorProgram {
  const { graph, symbols } = system;
  const isState = (name: string): boolean => system.states.includes(name);
  const known = new Map<Node, boolean>();
  const changes = (node: Node): boolean => mentions(node, isState, known);

  const slots = new Map<Node, number>();
  const slotOf = (node: Node): number => {
    let slot = slots.get(node);
    if (slot === undefined) {
      slot = slots.size;
      slots.set(node, slot);
    }
    return slot;
  };
  const constants: (readonly [number, Node])[] = [];
  const recurrences: Recurrence[] = [];
  const done = new Map<Node, Node>();
  const states = system.states.map((name) => slotOf(graph.symbol(name)));

  /** The node that stands for one, with everything that it rests on in the list before it. */
  const place = (given: Node): Node => {
    const before = done.get(given);
    if (before !== undefined) return before;
    const node = rewritten(graph, given, changes);
    if (node !== given) {
      const stands = placeAll(node);
      done.set(given, stands);
      return stands;
    }
    done.set(node, node);
    if (!changes(node)) {
      constants.push([slotOf(node), node]);
      return node;
    }
    if (node.op === "symbol") return node;
    const own = slotOf(node);
    const [a, b] = node.args.map((argument) => slotOf(place(argument)));
    const companion = companionOf(graph, node);
    // Sine and cosine need one another: both are known before the coefficient after is asked for.
    const mutual = companion?.op === "sin" || companion?.op === "cos";
    const second = companion === null ? (b ?? a!) : slotOf(mutual ? companion : placeAll(companion));
    const [, moves = true] = node.args.map(changes);
    recurrences.push(
      recurrence(node, { own, a: a!, b: second, aMoves: changes(node.args[0]!), bMoves: moves }),
    );
    if (mutual) placeAll(companion);
    return node;
  };
  const placeAll = (node: Node): Node => {
    for (const part of inOrder(node, done)) place(part);
    return done.get(node)!;
  };
  const accelerations = system.accelerations.map((node) => slotOf(placeAll(node)));
  return {
    slots: slots.size,
    states,
    accelerations,
    recurrences,
    constants: (parameters) =>
      constants.map(([slot, node]) => [
        slot,
        preciseValue(node, (name) => parameters[symbols.indexOf(name)]!),
      ]),
  };
}
