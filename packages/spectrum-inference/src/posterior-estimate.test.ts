import { describe, expect, it } from 'vitest';
import type { DiscrepancyPosterior } from './discrepancy-posterior.ts';
import { posteriorEstimate } from './posterior-estimate.ts';

/** A mixture of one-dimensional normals of sd 1 in the only variable. */
function mixture(parts: readonly (readonly [weight: number, mean: number])[]): DiscrepancyPosterior {
  const components = parts.map(([weight, mean]) => ({
    eps: 0,
    envelopeSd: 0,
    weight,
    posterior: { indices: [0], step: Float64Array.of(mean), factor: Float64Array.of(1), logEvidence: 0 },
  }));
  // Only the components are read.
  return { components } as unknown as DiscrepancyPosterior;
}

const itself = (): { value: number; gradient: Float64Array } => ({ value: 0, gradient: Float64Array.of(1) });

describe('posteriorEstimate', () => {
  it('is the normal interval for one normal', () => {
    const estimate = posteriorEstimate([{ weight: 1, posterior: mixture([[1, 3]]) }], itself);
    expect([estimate.value, estimate.sd]).toEqual([3, 1]);
    expect(estimate.high95).toBeCloseTo(3 + 1.959964, 5);
    expect(estimate.low95).toBeCloseTo(3 - 1.959964, 5);
  });

  it('keeps both of two modes that lie apart inside its interval', () => {
    const modes = [-5, 5].map((mean) => ({ weight: 0.5, posterior: mixture([[1, mean]]) }));
    const estimate = posteriorEstimate(modes, itself);
    expect(estimate.value).toBeCloseTo(0, 12);
    expect(estimate.sd).toBeCloseTo(Math.sqrt(26), 12);
    // Each tail holds 2.5 % of the whole, 5 % of its own mode: 1.644854 sd.
    expect(estimate.high95).toBeCloseTo(5 + 1.644854, 4);
    expect(estimate.low95).toBeCloseTo(-5 - 1.644854, 4);
  });

  it('adds what no residual can show to the variance', () => {
    const estimate = posteriorEstimate([{ weight: 1, posterior: mixture([[1, 0]]) }], itself, () => 3);
    expect(estimate.sd).toBeCloseTo(2, 12);
  });
});
