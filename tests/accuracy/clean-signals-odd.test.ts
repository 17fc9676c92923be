import { describe, expect, it } from 'vitest';
import { countCleanSignals } from './count-clean-signals.ts';

describe('the odd half of 50 clean signals of 3 to 6 spins with a known standard', () => {
  it('is releasable, right within 5 % and inside its intervals as often as promised', () => {
    const count = countCleanSignals(1);
    expect(count.signals).toBe(25);
    // Of all 50 at least 48 releasable and right, and at least 45 inside their intervals: half of it here, and no less.
    expect(count.releasable).toBeGreaterThanOrEqual(24);
    expect(count.withinFivePercent).toBeGreaterThanOrEqual(24);
    expect(count.covered).toBeGreaterThanOrEqual(23);
  }, 1_200_000);
});
