import type { CableNode } from '#calc';

/** How one level of the tree is drawn left of a row: a trunk that goes on, the branch to this row, or nothing. */
export type Guide = 'through' | 'branch' | 'last' | 'gap';

export interface TreeRow {
  readonly node: CableNode;
  /** One for each level, from the cabinet's terminals; the last is the branch to the box itself. */
  readonly guides: readonly Guide[];
  /** A trunk leaves this box. */
  readonly feeds: boolean;
  /** Way from the cabinet's terminals, m. */
  readonly metres: number;
}

/**
 * The boxes of one circuit as they hang on each other: a box, then all behind it, brothers by their location.
 * A box whose trunk begins at a box of another circuit, or that hangs on itself, stands at the cabinet's terminals.
 */
export function treeRows(nodes: readonly CableNode[]): readonly TreeRow[] {
  const children = childrenOf(nodes);
  const seen = new Set<string>();
  const walk = (list: readonly CableNode[], above: readonly boolean[], from: number): TreeRow[] =>
    list.filter((node) => !seen.has(node.id)).flatMap((node, at, all) => {
      seen.add(node.id);
      const goesOn = at < all.length - 1;
      const below = children.get(node.id) ?? [];
      const metres = from + node.lengthM;
      return [{ node, guides: guidesOf(above, goesOn), feeds: below.length > 0, metres }, ...walk(below, [...above, goesOn], metres)];
    });
  const hung = walk(children.get(null) ?? [], [], 0);
  const loose = nodes.filter((node) => !seen.has(node.id));
  return [...hung, ...loose.flatMap((node) => walk([node], [], 0))];
}

function childrenOf(nodes: readonly CableNode[]): ReadonlyMap<string | null, readonly CableNode[]> {
  const own = new Set(nodes.map((node) => node.id));
  const children = new Map<string | null, CableNode[]>();
  for (const node of [...nodes].sort((a, b) => a.location.localeCompare(b.location, 'en', { numeric: true }))) {
    const parent = node.parentId !== null && own.has(node.parentId) ? node.parentId : null;
    children.set(parent, [...(children.get(parent) ?? []), node]);
  }
  return children;
}

const guidesOf = (above: readonly boolean[], goesOn: boolean): readonly Guide[] =>
  [...above.map((on): Guide => (on ? 'through' : 'gap')), goesOn ? 'branch' : 'last'];
