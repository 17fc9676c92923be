/** The share, 0 to 1, of the strongest field in the sample that acts on a line of one compound. */
export type LineField = (frequencyHz: number) => number;

/** Lines within this distance share their radiation field: about a usual linewidth. */
const SHARED_FIELD_HZ = 0.7;

/**
 * The local intensity of a sample's lines, relative to the strongest place.
 *
 * Radiation damping broadens a line in proportion to the magnetisation that precesses with it; lines closer than a linewidth
 * act as one. First order of the linear form in REAL-DATA section 3: the mixing of lines is left out, which is enough to
 * notice the effect, not to correct for it.
 *
 * @param lines positions and amounts (weight times amount), any order
 */
export function createLineField(lines: readonly { frequencyHz: number; size: number }[]): LineField {
  const sorted = [...lines].sort((a, b) => a.frequencyHz - b.frequencyHz);
  const local = (frequencyHz: number): number => {
    let sum = 0;
    for (const line of sorted) {
      const distance = (line.frequencyHz - frequencyHz) / SHARED_FIELD_HZ;
      sum += line.size / (1 + distance * distance);
    }
    return sum;
  };
  let strongest = 0;
  for (const line of sorted) strongest = Math.max(strongest, local(line.frequencyHz));
  return (frequencyHz) => (strongest > 0 ? Math.max(0, local(frequencyHz)) / strongest : 0);
}
