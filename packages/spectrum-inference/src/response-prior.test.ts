import { describe, expect, it } from 'vitest';
import { responsePrior } from './response-prior.ts';

describe('responsePrior', () => {
  it('leaves nothing open after a 90 degree pulse and ten times the longest usual T1', () => {
    const { mean, sd } = responsePrior({ flipAngleDegrees: 90, repetitionSeconds: 200 });
    expect(mean).toBeCloseTo(1, 4);
    expect(sd).toBe(5e-4);
  });

  it('holds the published steady-state losses of fast pulsing within its width', () => {
    // (1 - E) / (1 - E cos a), 30 degrees, 3.2 s: T1 2, 3, 5 s give .967, .934, .869 (REAL-DATA section 7, its formula).
    const { mean, sd } = responsePrior({ flipAngleDegrees: 30, repetitionSeconds: 3.2 });
    for (const loss of [0.967, 0.934, 0.869]) expect(Math.abs(loss - mean)).toBeLessThan(2 * sd);
    expect(sd).toBeLessThan(0.1);
  });

  it('is wide when the pulse is not declared', () => {
    expect(responsePrior({ flipAngleDegrees: undefined, repetitionSeconds: 5 }).sd).toBeGreaterThan(0.05);
  });
});
