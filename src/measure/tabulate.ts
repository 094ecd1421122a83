import { ahead, angleOf, senseOf, TURN } from "./apsidal-angle.js";
import type { Passage } from "./passages.js";
import type { PreparedScenario, Run } from "./run.js";
import { distance } from "./stepping.js";
import { lessTurns, unwrap } from "./turns.js";

/**
 * Turns the passages of a run into its table of numbers, times, angles and distances.
 *
 * The apsidal angle is that swept: in the first whole orbit it was added up step by step, so that a strong
 * field may turn the apsis by more than half a turn; each later turn of the apsis is the one nearest to the
 * turn before it.
 *
 * @param firstSweep angle swept over the first whole orbit, rad; null in angle form or where none was whole
 */
export function tabulate(
  scenario: PreparedScenario,
  dimension: number,
  passages: readonly Passage[],
  firstSweep: number | null,
  step: number,
): Pick<Run, "numbers" | "times" | "angles" | "advances" | "distances"> {
  const first = passages[0];
  const kind = scenario.apsidalAngle;
  const sense = senseOf(scenario.state, dimension);
  const from = scenario.startsAtPeriapsis ? 0 : 1;
  let start = 0;
  let advances: number[] = [];
  if (first !== undefined && kind === "polar") {
    start = first.steps * step + first.rest;
    const since = (passage: Passage, turns: number): number =>
      lessTurns(passage.steps - first.steps, step, passage.rest - first.rest, turns);
    advances = passages.map(since);
  } else if (first !== undefined) {
    start = angleOf(kind, sense, first.state);
    const directions = passages.map((passage) => ahead(kind, sense, first.state, passage.state));
    advances = unwrap(directions, (firstSweep ?? TURN) - TURN);
  }
  return {
    numbers: passages.map((_, i) => from + i),
    times: passages.map((passage) => passage.steps * step + passage.rest),
    angles: advances.map((advance, i) => start + advance + i * TURN),
    advances,
    distances: passages.map((passage) =>
      distance(kind === "polar" ? "angle" : "time", passage.state, dimension),
    ),
  };
}
