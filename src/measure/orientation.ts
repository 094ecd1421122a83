/** Half a unit in the last place twice over: what the change from degrees to radians may add to an angle. */
const CONVERSION = 4 * Number.EPSILON;

/** Cosine and sine, exact at whole quarters of a turn, so that no dust of 6e-17 enters a state. */
export function cosineAndSine(angle: number): readonly [number, number] {
  const quarters = Math.round(angle / (Math.PI / 2));
  if (Math.abs(angle - quarters * (Math.PI / 2)) <= CONVERSION * Math.abs(angle)) {
    const place = ((quarters % 4) + 4) % 4;
    return [
      [1, 0],
      [0, 1],
      [-1, 0],
      [0, -1],
    ][place] as [number, number];
  }
  return [Math.cos(angle), Math.sin(angle)];
}

export type Vector = readonly [number, number, number];

/**
 * Turns a vector of the orbit's own plane (first axis to periapsis, second a quarter turn on along the
 * motion) into space: by the argument of periapsis, the inclination and the longitude of the node, in that
 * order (C. D. Murray and S. F. Dermott, Solar System Dynamics (1999), 2.8). Zero components are plain 0.
 */
export function intoSpace(
  along: number,
  across: number,
  orientation: {
    readonly inclination: number;
    readonly node: number;
    readonly argumentOfPeriapsis: number;
  },
): Vector {
  const [ci, si] = cosineAndSine(orientation.inclination);
  const [cn, sn] = cosineAndSine(orientation.node);
  const [cw, sw] = cosineAndSine(orientation.argumentOfPeriapsis);
  const p = along * cw - across * sw;
  const q = along * sw + across * cw;
  // Adding 0 makes a -0 plain.
  return [p * cn - q * ci * sn + 0, p * sn + q * ci * cn + 0, q * si + 0];
}
