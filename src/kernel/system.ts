import type { EquationsDefinition } from "../equations/definition.js";
import { gradient } from "../formula/differentiate.js";
import { Graph, type Node } from "../formula/graph.js";
import { parseFormula } from "../formula/parse.js";
import { mentions, substitute } from "../formula/walk.js";

/** Which specialisation of a definition to compile. */
export interface Specialisation {
  /** Parameters that stay symbols, by claim name; the others are folded in at their defaults. */
  readonly parameters: readonly string[];
  /** The start lies in the xy plane with its velocity: leave z out where the equations keep it zero. */
  readonly planar: boolean;
}

/** Equations as expression graphs, ready to be written as a step loop. */
export interface CompiledSystem {
  readonly definition: EquationsDefinition;
  readonly graph: Graph;
  /** Names of the coordinates, and of their rates in the same order. */
  readonly coordinates: readonly string[];
  readonly rates: readonly string[];
  /** Coordinates, then rates. */
  readonly states: readonly string[];
  /** Claim names of the parameters that a loop takes, and their symbols in the same order. */
  readonly parameters: readonly string[];
  readonly symbols: readonly string[];
  /** Of each coordinate. */
  readonly accelerations: readonly Node[];
  readonly velocityDependent: boolean;
  /** x·v, or -u' in angle form. */
  readonly radialRate: Node;
  readonly conserved: readonly ConservedQuantity[];
}

export interface ConservedQuantity {
  readonly name: string;
  /** One of a scalar, as many as a vector has. */
  readonly components: readonly Node[];
  readonly truncatedAt: string | null;
}

/**
 * Compiles a definition.
 *
 * @throws FormulaError where a formula cannot be read
 */
export function compileSystem(definition: EquationsDefinition, given: Specialisation): CompiledSystem {
  const graph = new Graph();
  const kept = Object.entries(definition.parameters).filter(
    ([name, { default: value }]) => given.parameters.includes(name) || value === undefined,
  );
  const symbols = kept.map(([, { symbol }]) => symbol);
  const all = Object.entries(definition.coordinates);

  const scope = new Map<string, Node>();
  for (const { symbol, default: value } of Object.values(definition.parameters)) {
    scope.set(symbol, symbols.includes(symbol) ? graph.symbol(symbol) : graph.number(String(value)));
  }
  for (const [name, { rate }] of all) {
    scope.set(name, graph.symbol(name));
    scope.set(rate, graph.symbol(rate));
  }
  const read = (text: string): Node => parseFormula(graph, text, (name) => scope.get(name) ?? null);
  for (const [name, text] of Object.entries(definition.let ?? {})) scope.set(name, read(text));

  const potential = definition.potential === undefined ? null : read(definition.potential);
  const accelerations =
    potential === null
      ? all.map(([name]) => read(definition.acceleration![name]!))
      : gradient(
          graph,
          graph.negate(potential),
          all.map(([name]) => name),
        );
  const conserved: ConservedQuantity[] = Object.entries(definition.conserved).map(
    ([name, { formula, truncatedAt }]) => ({
      name,
      components: [formula].flat().map(read),
      truncatedAt: truncatedAt ?? null,
    }),
  );
  if (potential !== null) conserved.unshift(energy(graph, all, potential));

  const third = all[2];
  const flat = third !== undefined && given.planar ? flatten(graph, third[0], third[1].rate) : null;
  const planar = flat !== null && flat(accelerations[2]!) === graph.zero;
  const reduce = planar ? flat : (node: Node) => node;
  const used = planar ? all.slice(0, 2) : all;
  const coordinates = used.map(([name]) => name);
  const rates = used.map(([, { rate }]) => rate);
  const reduced = accelerations.slice(0, used.length).map(reduce);
  return {
    definition,
    graph,
    coordinates,
    rates,
    states: [...coordinates, ...rates],
    parameters: kept.map(([name]) => name),
    symbols,
    accelerations: reduced,
    velocityDependent: reduced.some((node) => mentions(node, (name) => rates.includes(name))),
    radialRate:
      definition.form === "angle" ? graph.negate(graph.symbol(rates[0]!)) : dot(graph, coordinates, rates),
    conserved: conserved.map((quantity) => ({ ...quantity, components: quantity.components.map(reduce) })),
  };
}

/** v²/2 + Φ, per unit mass. */
function energy(
  graph: Graph,
  coordinates: readonly (readonly [string, { readonly rate: string }])[],
  potential: Node,
): ConservedQuantity {
  const rates = coordinates.map(([, { rate }]) => rate);
  const kinetic = graph.divide(dot(graph, rates, rates), graph.number(2));
  return { name: "energy", components: [graph.add(kinetic, potential)], truncatedAt: null };
}

function dot(graph: Graph, one: readonly string[], other: readonly string[]): Node {
  return one
    .map((name, i) => graph.multiply(graph.symbol(name), graph.symbol(other[i]!)))
    .reduce((sum, term) => graph.add(sum, term));
}

const flatten = (graph: Graph, coordinate: string, rate: string): ((node: Node) => Node) => {
  const zeros = new Map([
    [coordinate, graph.zero],
    [rate, graph.zero],
  ]);
  return (node) => substitute(graph, node, zeros);
};
