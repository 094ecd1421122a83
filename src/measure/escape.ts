import type { PreparedScenario } from "./run.js";
import { distance, type Form } from "./stepping.js";

/**
 * At twenty times the apoapsis the field is Newton's but for a twentieth of what is added to it at the
 * start, so that an orbit which is unbound there does not come back.
 */
const FAR = 20;
/** A bound orbit that goes out a thousand times as far is longer by 1000^1.5/2^1.5: no span waits for it. */
const GONE = 1e3;

/** True once a state will not return within any span: unbound and far, or bound and gone. */
export function hasEscaped(
  form: Form,
  scenario: PreparedScenario,
  state: ArrayLike<number>,
  dimension: number,
): boolean {
  const apoapsis = scenario.semiMajorAxis * (1 + scenario.eccentricity);
  const r = distance(form, state, dimension);
  if (form === "angle") return !(r > 0 && r <= GONE * apoapsis);
  if (r > GONE * apoapsis) return true;
  if (r <= FAR * apoapsis) return false;
  const GM = (4 * Math.PI ** 2 * scenario.semiMajorAxis ** 3) / scenario.period ** 2;
  let speedSquared = 0;
  for (let i = dimension / 2; i < dimension; i++) speedSquared += state[i]! ** 2;
  return speedSquared / 2 >= GM / r;
}
