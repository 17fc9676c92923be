/** States of one total Iz within one sector of one component, and the operators among them. */
export interface CompiledBlock {
  readonly size: number;
  /** (size x spinCount) Iz of each spin in each state, row-major. */
  readonly iz: Float64Array;
  /** Off-diagonal elements of H, lower triangle: element (row, column) is coefficient times the coupling. */
  readonly offRow: Int32Array;
  readonly offColumn: Int32Array;
  readonly offCoupling: Int32Array;
  readonly offCoefficient: Float64Array;
  /** Elements of I_g- from this block (column) to the next lower one (row). */
  readonly lowerRow: Int32Array;
  readonly lowerColumn: Int32Array;
  readonly lowerGroup: Int32Array;
  readonly lowerCoefficient: Float64Array;
}

/** One choice of total spin for every composite spin, with the number of ways to make it. */
export interface CompiledSector {
  readonly multiplicity: number;
  /** From the highest total Iz down. */
  readonly blocks: readonly CompiledBlock[];
}

/** A component's spins as seen by its blocks. */
export interface ComponentSpins {
  /** Total spin of each composite spin in this sector. */
  readonly totalSpins: readonly number[];
  /** Place of each spin's group among the component's groups. */
  readonly groups: readonly number[];
  readonly couplings: readonly { readonly a: number; readonly b: number; readonly term: number }[];
}

/** Lay out the blocks of one sector. */
export function compileSector(spins: ComponentSpins, multiplicity: number): CompiledSector {
  const byIz = statesByTotalIz(spins.totalSpins);
  const blocks = byIz.map((states, place) => compileBlock(spins, states, byIz[place + 1]));
  return { multiplicity, blocks };
}

type State = readonly number[];

function statesByTotalIz(totalSpins: readonly number[]): State[][] {
  let states: State[] = [[]];
  for (const total of totalSpins) {
    states = states.flatMap((state) => Array.from({ length: 2 * total + 1 }, (_, k) => [...state, total - k]));
  }
  const byIz = new Map<number, State[]>();
  for (const state of states) {
    const twice = Math.round(2 * state.reduce((sum, m) => sum + m, 0));
    byIz.set(twice, [...(byIz.get(twice) ?? []), state]);
  }
  return [...byIz.keys()].sort((a, b) => b - a).map((twice) => byIz.get(twice) ?? []);
}

function compileBlock(
  spins: ComponentSpins,
  states: readonly State[],
  below: readonly State[] | undefined,
): CompiledBlock {
  const place = indexOf(states);
  const lowerPlace = indexOf(below ?? []);
  const off: { row: number; column: number; term: number; coefficient: number }[] = [];
  const lower: { row: number; column: number; group: number; coefficient: number }[] = [];
  states.forEach((state, column) => {
    for (const { a, b, term } of spins.couplings) {
      for (const [up, down] of [
        [a, b],
        [b, a],
      ]) {
        const row = place.get(moved(state, up, 1, down, -1));
        if (row === undefined || row <= column) continue;
        // J I_a.I_b: (J / 2) I_a+ I_b- off the diagonal.
        off.push({
          row,
          column,
          term,
          coefficient: 0.5 * raising(spins.totalSpins[up], state[up]) * lowering(spins.totalSpins[down], state[down]),
        });
      }
    }
    spins.groups.forEach((group, spin) => {
      const row = lowerPlace.get(moved(state, spin, -1));
      if (row !== undefined)
        lower.push({ row, column, group, coefficient: lowering(spins.totalSpins[spin], state[spin]) });
    });
  });
  return {
    size: states.length,
    iz: Float64Array.from(states.flat()),
    offRow: Int32Array.from(off, (entry) => entry.row),
    offColumn: Int32Array.from(off, (entry) => entry.column),
    offCoupling: Int32Array.from(off, (entry) => entry.term),
    offCoefficient: Float64Array.from(off, (entry) => entry.coefficient),
    lowerRow: Int32Array.from(lower, (entry) => entry.row),
    lowerColumn: Int32Array.from(lower, (entry) => entry.column),
    lowerGroup: Int32Array.from(lower, (entry) => entry.group),
    lowerCoefficient: Float64Array.from(lower, (entry) => entry.coefficient),
  };
}

function indexOf(states: readonly State[]): Map<string, number> {
  return new Map(states.map((state, place) => [state.join(), place]));
}

/** Key of the state with one or two of its Iz changed. */
function moved(state: State, spin: number, by: number, other = -1, otherBy = 0): string {
  return state.map((m, s) => (s === spin ? m + by : s === other ? m + otherBy : m)).join();
}

/** sqrt(S(S+1) - m(m+1)), the element of I+ from m. */
function raising(total: number, m: number): number {
  return Math.sqrt(total * (total + 1) - m * (m + 1));
}

/** sqrt(S(S+1) - m(m-1)), the element of I- from m. */
function lowering(total: number, m: number): number {
  return Math.sqrt(total * (total + 1) - m * (m - 1));
}
