import { describe, expect, it } from 'vitest';
import { checkMeasurement } from './check-measurement.ts';
import type { GeneratedMeasurement } from './generate-measurement.ts';
import type { GeneratedComponent } from './isotopologues.ts';
import type { SignalFaults } from './signal-faults.ts';

const component: GeneratedComponent = {
  amount: 1,
  spins: [
    { shiftHz: 10, group: 0 },
    { shiftHz: 40, group: 1 },
  ],
  couplings: [{ a: 0, b: 1, couplingHz: 7 }],
  groups: [
    { responseFactor: 1, decayPerSecond: 3 },
    { responseFactor: 1, decayPerSecond: 0 },
  ],
};
const measurement: GeneratedMeasurement = {
  components: [component],
  sampleCount: 8,
  dwellSeconds: 1e-3,
  timeZeroSamples: 0,
  phaseRadians: 0,
  noiseSdPerComponent: 0,
  seed: 1,
};
const damping = { decayPerSecond: 1, pullRadPerSecond: 0, ofSignal: 1, stepsPerSample: 2 };

describe('checkMeasurement', () => {
  it('takes what can be made', () => {
    expect(() => checkMeasurement({ ...measurement, faults: { radiationDamping: damping } })).not.toThrow();
  });

  const settings: [change: Partial<GeneratedMeasurement>, message: string][] = [
    [{ sampleCount: 0 }, 'sampleCount a whole number > 0, got 0'],
    [{ sampleCount: 2.5 }, 'sampleCount a whole number > 0, got 2.5'],
    [{ dwellSeconds: -0.0001 }, 'dwellSeconds > 0, got -0.0001'],
    [{ dwellSeconds: Number.POSITIVE_INFINITY }, 'dwellSeconds > 0, got Infinity'],
    [{ timeZeroSamples: Number.NaN }, 'finite timeZeroSamples, got NaN'],
    [{ phaseRadians: Number.NaN }, 'finite phaseRadians, got NaN'],
    [{ noiseSdPerComponent: -1 }, 'noiseSdPerComponent >= 0, got -1'],
  ];
  it.each(settings)('refuses the sampling %o', (change, message) => {
    expect(() => checkMeasurement({ ...measurement, ...change })).toThrow(message);
  });

  const [spin] = component.spins;
  const satellite = { spins: [0], couplingHz: 6.6, abundanceFraction: 0.0467 };
  const components: [change: Partial<GeneratedComponent>, message: string][] = [
    [{ spins: [] }, '1 to 6 spins in a component, got 0'],
    [{ spins: Array.from({ length: 7 }, () => spin) }, '1 to 6 spins in a component, got 7'],
    [{ amount: Number.NaN }, 'a finite amount, got NaN'],
    [{ spins: [{ shiftHz: 1, group: 2 }] }, 'group 0 to 1, got 2'],
    [{ spins: [{ shiftHz: Number.NaN, group: 0 }] }, 'finite shiftHz, got NaN'],
    [{ couplings: [{ a: 0, b: 2, couplingHz: 7 }] }, 'a coupled spin 0 to 1, got 2'],
    [{ couplings: [{ a: 1, b: 1, couplingHz: 7 }] }, 'a coupling between two spins, got 1 and 1'],
    [{ couplings: [{ a: 0, b: 1, couplingHz: Number.NaN }] }, 'finite couplingHz, got NaN'],
    [{ groups: component.groups.map((group) => ({ ...group, decayPerSecond: -1 })) }, 'decayPerSecond >= 0, got -1'],
    [{ satellites: Array.from({ length: 4 }, () => satellite) }, 'at most 3 satellites, got 4'],
    [{ satellites: [{ ...satellite, spins: [5] }] }, 'a split spin 0 to 1, got 5'],
    [{ satellites: [{ ...satellite, abundanceFraction: 4.67 }] }, 'abundanceFraction 0 to 1, got 4.67'],
  ];
  it.each(components)('refuses the component %o', (change, message) => {
    const faulty = { ...measurement, components: [component, { ...component, ...change }] };
    expect(() => checkMeasurement(faulty)).toThrow(message);
  });

  const faults: [faults: SignalFaults, message: string][] = [
    [{ firstSampleErrors: Array.from({ length: 9 }, () => 0.1) }, 'at most 8 first samples spoiled, got 9'],
    [{ fullScaleCounts: 0 }, 'fullScaleCounts whole and > 0, got 0'],
    [{ fieldDrift: { hertzPerSecond: 0, scanRangeHz: -1 } }, 'scanRangeHz >= 0, got -1'],
    [{ radiationDamping: { ...damping, stepsPerSample: 0 } }, 'stepsPerSample whole and > 0, got 0'],
    [{ radiationDamping: { ...damping, ofSignal: 0 } }, 'ofSignal > 0, got 0'],
    [{ radiationDamping: { ...damping, stepsPerSample: 20000 } }, 'at most 131072 steps of feedback, got 160000'],
  ];
  it.each(faults)('refuses the fault %o', (wrong, message) => {
    expect(() => checkMeasurement({ ...measurement, faults: wrong })).toThrow(message);
  });
});
