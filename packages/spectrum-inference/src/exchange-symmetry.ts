import type { SpinSystemQuestion } from './spectrum-question.ts';

/** Two couplings of one system that change places when two like spins of a group do: no spectrum can tell which is which. */
export interface ExchangeablePair {
  readonly first: number;
  readonly second: number;
}

/**
 * Exchanges of couplings that leave every spectrum of the system as it is.
 *
 * A group of chemically equivalent spins may have its spins renamed. Each such renaming permutes the pairs of the couplings;
 * where it maps every coupling onto a coupling, it permutes coupling values. J and J' of an AA'XX' system are the usual case.
 *
 * @returns independent lists of pairs, each list to be exchanged together; identity renamings are left out
 */
export function exchangeSymmetries(system: SpinSystemQuestion): ExchangeablePair[][] {
  const found = new Map<string, ExchangeablePair[]>();
  for (const renaming of renamings(system)) {
    const image = couplingPermutation(system, renaming);
    if (image === undefined) continue;
    const pairs = image.flatMap((to, from) => (to > from && image[to] === from ? [{ first: from, second: to }] : []));
    if (pairs.length > 0) found.set(JSON.stringify(pairs), pairs);
  }
  const lists = [...found.values()].sort((a, b) => a.length - b.length);
  // An exchange that is the union of smaller ones adds nothing.
  return lists.filter((list, i) => !isUnionOfSmaller(list, lists.slice(0, i)));
}

function isUnionOfSmaller(list: readonly ExchangeablePair[], smaller: readonly ExchangeablePair[][]): boolean {
  return list.every((pair) =>
    smaller.some(
      (other) =>
        other.length < list.length &&
        other.some((p) => p.first === pair.first && p.second === pair.second) &&
        other.every((p) => list.some((q) => q.first === p.first && q.second === p.second)),
    ),
  );
}

/** All combinations of swapping the two spins of each group of two like spins. */
function renamings(system: SpinSystemQuestion): number[][] {
  let start = 0;
  const swaps: [number, number][] = [];
  for (const group of system.groups) {
    if (group.spins.length === 2 && group.spins[0].protonCount === group.spins[1].protonCount)
      swaps.push([start, start + 1]);
    start += group.spins.length;
  }
  const identity = Array.from({ length: start }, (_, i) => i);
  return Array.from({ length: 1 << swaps.length }, (_, code) => {
    const renaming = identity.slice();
    swaps.forEach(([a, b], s) => {
      if (((code >> s) & 1) === 1) {
        renaming[a] = b;
        renaming[b] = a;
      }
    });
    return renaming;
  });
}

function couplingPermutation(system: SpinSystemQuestion, renaming: readonly number[]): number[] | undefined {
  const keyOf = (pairs: readonly (readonly [number, number])[], map: readonly number[]): string =>
    pairs
      .map(([a, b]) => [map[a], map[b]].sort((x, y) => x - y).join('-'))
      .sort()
      .join(' ');
  const identity = renaming.map((_, i) => i);
  const byKey = new Map(system.couplings.map((coupling, c) => [keyOf(coupling.pairs, identity), c]));
  const image = system.couplings.map((coupling) => byKey.get(keyOf(coupling.pairs, renaming)));
  return image.every((c) => c !== undefined) ? (image as number[]) : undefined;
}
