/**
 * Places of labels along an edge, moved apart until none covers another; in the order given.
 *
 * @param places where each belongs, 0 to 1
 * @param apart least distance of two
 */
export function spread(places: readonly number[], apart: number): readonly number[] {
  const order = places.map((_, k) => k).toSorted((a, b) => places[a]! - places[b]!);
  const moved = [...places];
  // Groups that touch are centred on where their members belong, and grow until they touch no other.
  let groups = order.map((k) => ({ members: [k], middle: places[k]! }));
  for (;;) {
    const k = groups.findIndex((group, i) => i > 0 && start(group) < end(groups[i - 1]!) + apart);
    if (k < 0) break;
    const members = [...groups[k - 1]!.members, ...groups[k]!.members];
    const middle = members.reduce((sum, member) => sum + places[member]!, 0) / members.length;
    const half = ((members.length - 1) * apart) / 2;
    const merged = { members, middle: Math.min(Math.max(middle, half), Math.max(half, 1 - half)) };
    groups = [...groups.slice(0, k - 1), merged, ...groups.slice(k + 1)];
  }
  for (const { members, middle } of groups) {
    members.forEach((member, i) => {
      moved[member] = middle + (i - (members.length - 1) / 2) * apart;
    });
  }
  return moved;

  function start({ members, middle }: { members: number[]; middle: number }): number {
    return middle - ((members.length - 1) * apart) / 2;
  }
  function end({ members, middle }: { members: number[]; middle: number }): number {
    return middle + ((members.length - 1) * apart) / 2;
  }
}

/** A catalog name cut to a tag where there is no room: dormand-prince-8 is dp8, implicit-midpoint im. */
export function tag(method: string): string {
  const parts = method.split("-");
  if (parts.length === 1) return method.slice(0, 8);
  return parts.map((part) => (/^\d/.test(part) ? part : part[0])).join("");
}
