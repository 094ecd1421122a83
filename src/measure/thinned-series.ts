/**
 * A curve thinned as it comes in, for drawing: the range of the abscissa is cut into equal bins, and of each
 * bin the points of least and largest ordinate stay, in their order, so that no peak is lost.
 */
export class ThinnedSeries {
  readonly #end: number;
  readonly #bins: ({ least: Point; largest: Point } | undefined)[];

  /**
   * @param end largest abscissa to come; the smallest is 0
   * @param most number of points kept, even
   */
  constructor(end: number, most: number) {
    this.#end = end;
    this.#bins = new Array(most / 2);
  }

  add(x: number, y: number): void {
    const place = Math.floor((x / this.#end) * this.#bins.length);
    const index = Math.max(0, Math.min(this.#bins.length - 1, place));
    const bin = this.#bins[index];
    if (bin === undefined) this.#bins[index] = { least: { x, y }, largest: { x, y } };
    else if (y < bin.least.y) bin.least = { x, y };
    else if (y > bin.largest.y) bin.largest = { x, y };
  }

  points(): readonly Point[] {
    return this.#bins.flatMap((bin) => {
      if (bin === undefined) return [];
      const { least, largest } = bin;
      if (least.x === largest.x) return [least];
      return least.x < largest.x ? [least, largest] : [largest, least];
    });
  }
}

interface Point {
  readonly x: number;
  readonly y: number;
}
