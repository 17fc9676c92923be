/** Prior of eps: half-Cauchy of this scale; printed in every result. */
export const EPS_PRIOR_SCALE = 0.01;

/** Coarse ladder of eps: 0, then geometric up to beyond any lineshape. */
const EPS_MIN = 3e-4;
const EPS_MAX = 0.6;
const COARSE_STEP = 2.5;
/** Fine ladder about the best coarse point: a few sd of ln eps at some hundred bins. */
const FINE_STEP = 1.1;
const FINE_REACH = 8;

/** The coarse grid, rising from 0. */
export function coarseEpsGrid(): number[] {
  const values = [0];
  for (let eps = EPS_MIN; eps < EPS_MAX; eps *= COARSE_STEP) values.push(eps);
  return values;
}

/** Points about a coarse maximum that the coarse grid lacks; about 0 none are needed, the prior mass there is one cell. */
export function fineEpsGrid(best: number): number[] {
  if (best === 0) return [];
  const values: number[] = [];
  let up = best;
  let down = best;
  for (let i = 0; i < FINE_REACH; i += 1) {
    up *= FINE_STEP;
    down /= FINE_STEP;
    values.push(up, down);
  }
  return values;
}

/** log prior mass of each point of a rising grid: the cell between the middles to its neighbours. */
export function logEpsMass(grid: readonly number[]): number[] {
  const cumulative = (eps: number): number => (2 / Math.PI) * Math.atan(eps / EPS_PRIOR_SCALE);
  return grid.map((eps, i) => {
    const low = i === 0 ? 0 : (eps + grid[i - 1]) / 2;
    const high = i === grid.length - 1 ? Number.POSITIVE_INFINITY : (eps + grid[i + 1]) / 2;
    return Math.log(cumulative(high) - cumulative(low));
  });
}

/**
 * Prior of the envelope's size, the sd of each of its weights: absent with half the mass, else 0.3 % to 30 % evenly in the
 * logarithm (REAL-DATA step 9: up to 0.3; INTERVALS: inferred 0.001 to 0.1).
 */
export const ENVELOPE_SD_GRID: readonly { readonly sd: number; readonly logMass: number }[] = [
  { sd: 0, logMass: Math.log(0.5) },
  ...[0.003, 0.01, 0.03, 0.1, 0.3].map((sd) => ({ sd, logMass: Math.log(0.1) })),
];
