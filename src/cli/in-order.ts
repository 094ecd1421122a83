/**
 * Works on items a few at a time and yields what comes of them in their own order.
 *
 * @param atOnce items under way or waiting to be yielded
 * @param work must not reject
 */
export async function* inOrder<Item, Result>(
  items: readonly Item[],
  atOnce: number,
  work: (item: Item, index: number) => Promise<Result>,
): AsyncGenerator<Result, void, undefined> {
  const underWay: Promise<Result>[] = [];
  for (let next = 0; next < items.length || underWay.length > 0; ) {
    while (next < items.length && underWay.length < atOnce) {
      underWay.push(work(items[next]!, next));
      next++;
    }
    yield await underWay.shift()!;
  }
}
