import { createSeededDraws, generateSignal } from '@spinassay/signal-generator';
import {
  compileSpinTopology,
  computeTransitionsInto,
  createTransitionTable,
  createTransitionWorkspace,
} from '@spinassay/spin-dynamics';
import { describe, expect, it } from 'vitest';

/** Closest agreement asked for: max |dS| / |S(0)| without faults (issue 2). */
const AGREEMENT = 1e-6;
const SAMPLING = { sampleCount: 4096, dwellSeconds: 1 / 5000, timeZeroSamples: 0.21 };

/** Two ways that share no code: steps of a propagator, and lines of a diagonalised Hamiltonian. */
function disagreement(spinCount: number, seed: number): number {
  const draws = createSeededDraws(seed);
  const shifts = Array.from({ length: spinCount }, () => draws.uniform(-900, 900));
  if (spinCount > 2) shifts[2] = shifts[1] + draws.uniform(0, 20);
  const couplings = shifts.flatMap((_, b) =>
    shifts.slice(0, b).map((__, a) => ({ a, b, couplingHz: draws.uniform(-15, 15) })),
  );
  const groups = shifts.map(() => ({ responseFactor: draws.uniform(0.7, 1.1), decayPerSecond: draws.uniform(2, 6) }));
  const signal = generateSignal({
    ...SAMPLING,
    components: [{ amount: 3, spins: shifts.map((shiftHz, group) => ({ shiftHz, group })), couplings, groups }],
    phaseRadians: 0,
    noiseSdPerComponent: 0,
    seed,
  });
  const compiled = compileSpinTopology(
    {
      spins: shifts.map((_, s) => ({ protonCount: 1, groupIndex: s, shiftIndex: s })),
      groupCount: spinCount,
      shiftCount: spinCount,
      couplingCount: couplings.length,
      couplings: couplings.map(({ a, b }, couplingIndex) => ({ spinA: a, spinB: b, couplingIndex })),
    },
    { lineWeightMin: 1e-9 },
  );
  const table = createTransitionTable(compiled);
  computeTransitionsInto(
    compiled,
    Float64Array.from(shifts),
    Float64Array.from(couplings, ({ couplingHz }) => couplingHz),
    createTransitionWorkspace(compiled),
    table,
  );
  const start = groups.reduce((sum, { responseFactor }) => sum + 3 * responseFactor, 0);
  let worst = 0;
  for (let n = 0; n < SAMPLING.sampleCount; n += 37) {
    const seconds = (n - SAMPLING.timeZeroSamples) * SAMPLING.dwellSeconds;
    let re = signal[2 * n];
    let im = signal[2 * n + 1];
    for (let l = 0; l < table.lineCount; l += 1) {
      const angle = 2 * Math.PI * table.frequencyHz[l] * seconds;
      groups.forEach(({ responseFactor, decayPerSecond }, g) => {
        const size = 3 * responseFactor * table.groupWeight[l * spinCount + g] * Math.exp(-decayPerSecond * seconds);
        re -= size * Math.cos(angle);
        im -= size * Math.sin(angle);
      });
    }
    worst = Math.max(worst, Math.hypot(re, im) / start);
  }
  return worst;
}

describe('the generator and the model', () => {
  it.each([1, 2, 3, 4, 5])(
    'agree on systems of %d spins, response factors, decays and time zero included',
    (spinCount) => {
      const worst = Math.max(...[1, 2, 3].map((seed) => disagreement(spinCount, seed)));
      console.log(`${spinCount} spins: max |dS| / |S(0)| = ${worst.toExponential(1)}`);
      expect(worst).toBeLessThan(AGREEMENT);
    },
  );
});
