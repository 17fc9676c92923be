/** Of the candidates the one with the fewest edits to the text; undefined when more than half of the text would have to change. */
export function nearestText(text: string, candidates: readonly string[]): string | undefined {
  let nearest: string | undefined;
  let fewest = Math.floor(text.length / 2) + 1;
  for (const candidate of candidates) {
    const count = editCount(text, candidate);
    if (count < fewest) {
      fewest = count;
      nearest = candidate;
    }
  }
  return nearest;
}

/**
 * Insertions, deletions and substitutions from one text to another.
 *
 * @source Wagner & Fischer, J. ACM 21 (1974) 168-173, one row at a time
 */
export function editCount(from: string, to: string): number {
  let row = Array.from({ length: to.length + 1 }, (_, index) => index);
  for (let i = 1; i <= from.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= to.length; j += 1) {
      const substitution = (row[j - 1] ?? 0) + (from[i - 1] === to[j - 1] ? 0 : 1);
      next.push(Math.min(substitution, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[to.length] ?? 0;
}
