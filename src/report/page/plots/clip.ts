/** A place in a plot whose horizontal axis is logarithmic. */
export interface Place {
  readonly n: number;
  readonly value: number;
}

/**
 * A curve cut at the lower and upper edge of its frame. A place with value NaN ends a piece. The curves of coarse
 * rungs leave the frame by orders of magnitude: cut by the viewer instead, their dashes would be millions.
 */
export function clip(points: readonly Place[], [low, high]: readonly [number, number]): readonly Place[] {
  const isInside = ({ value }: Place): boolean => value >= low && value <= high;
  return points.flatMap((point, k) => {
    const next = points[k + 1];
    const own = isInside(point) ? [point] : [];
    if (next === undefined) return own;
    const crossings = [low, high]
      .filter((edge) => (point.value - edge) * (next.value - edge) < 0)
      .map((edge) => crossing(point, next, edge))
      .sort((a, b) => a.n - b.n);
    const gap = isInside(point) && isInside(next) ? [] : [{ n: next.n, value: Number.NaN }];
    return [...own, ...crossings, ...gap];
  });
}

/** Where the straight line on the paper from one place to another meets a level. */
function crossing(from: Place, to: Place, level: number): Place {
  const share = (level - from.value) / (to.value - from.value);
  return { n: from.n * (to.n / from.n) ** share, value: level };
}
