/** A rooted tree: its branches, which are trees, in a canonical order. */
export interface Tree {
  readonly branches: readonly Tree[];
  /** Number of vertices. */
  readonly order: number;
  /** γ(t): the order times the densities of the branches. */
  readonly density: number;
  readonly key: string;
}

function tree(branches: readonly Tree[]): Tree {
  const sorted = branches.toSorted((a, b) => (a.key < b.key ? -1 : 1));
  const order = 1 + sorted.reduce((sum, branch) => sum + branch.order, 0);
  return {
    branches: sorted,
    order,
    density: sorted.reduce((product, branch) => product * branch.density, order),
    key: `[${sorted.map(({ key }) => key).join("")}]`,
  };
}

/** All rooted trees up to an order, by order; index 0 is empty. */
export function treesUpTo(order: number): readonly (readonly Tree[])[] {
  const byOrder: Tree[][] = [[], [tree([])]];
  for (let n = 2; n <= order; n++) {
    // A tree of n vertices is one of fewer with a branch grafted onto its root.
    const found = new Map<string, Tree>();
    for (let branchOrder = 1; branchOrder < n; branchOrder++) {
      for (const stem of byOrder[n - branchOrder]!) {
        for (const branch of byOrder[branchOrder]!) {
          const grafted = tree([...stem.branches, branch]);
          found.set(grafted.key, grafted);
        }
      }
    }
    byOrder.push([...found.values()]);
  }
  return byOrder;
}
