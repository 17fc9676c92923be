import { describe, expect, it } from 'vitest';
import { decayFromLinewidth, hertzFromShift, linewidthFromDecay, shiftFromHertz } from './conversions.ts';
import {
  celsius,
  hertz,
  type MillimolesPerLitre,
  megahertz,
  millimolesPerLitre,
  type PartsPerMillion,
  partsPerMillion,
  radians,
  seconds,
  UnitError,
} from './quantities.ts';
import { convertShift, waterShift } from './shift-scales.ts';

describe('quantities', () => {
  it('refuses numbers that are none, naming the unit', () => {
    expect(() => hertz(Number.NaN)).toThrow(UnitError);
    expect(() => seconds(Number.POSITIVE_INFINITY)).toThrow('finite number of seconds');
  });

  it('keeps a delay from passing for a frequency', () => {
    // @ts-expect-error a delay is not a frequency
    expect(linewidthFromDecay(seconds(1))).toBeCloseTo(1 / Math.PI, 15);
  });

  it('lets a concentration be negative but not endless', () => {
    expect(millimolesPerLitre(-0.2)).toBe(-0.2);
    expect(() => millimolesPerLitre(Number.NEGATIVE_INFINITY)).toThrow('finite number of mmol/L, got -Infinity');
  });

  it('keeps quantities of unlike units apart', () => {
    // @ts-expect-error a phase is not a shift
    const shift: PartsPerMillion = radians(1);
    // @ts-expect-error a temperature is not a concentration
    const amount: MillimolesPerLitre = celsius(25);
    // @ts-expect-error a frequency and a shift do not change places
    const swapped = shiftFromHertz(partsPerMillion(1), partsPerMillion(0), megahertz(500));
    // @ts-expect-error the carrier is a shift, not a frequency
    hertzFromShift(partsPerMillion(1), megahertz(500), megahertz(500));
    expect([shift, amount, swapped].every(Number.isFinite)).toBe(true);
  });
});

describe('conversions', () => {
  it('places a 13C satellite pair as the published position check does', () => {
    // REFERENCE section 6: CH3 at 1.91 ppm, J 127 Hz, 600.13 MHz, isotope shift -2 ppb: 2.01381 and 1.80219 ppm.
    const field = megahertz(600.13);
    const zero = partsPerMillion(0);
    const centre = hertzFromShift(partsPerMillion(1.91 - 0.002), zero, field);
    expect(shiftFromHertz(hertz(centre + 63.5), zero, field)).toBeCloseTo(2.01381, 5);
    expect(shiftFromHertz(hertz(centre - 63.5), zero, field)).toBeCloseTo(1.80219, 5);
  });

  it('turns a linewidth into a decay and back', () => {
    expect(linewidthFromDecay(decayFromLinewidth(hertz(1.3)))).toBeCloseTo(1.3, 15);
  });

  it('knows the decay whose Lorentzian has half its height half a width away', () => {
    // By hand: |1 / (R + 2 pi i f)| real part R / (R^2 + 4 pi^2 f^2) falls to half at f = w / 2 when R = pi w.
    const decay = decayFromLinewidth(hertz(2));
    const height = (offsetHz: number) => decay / (decay * decay + 4 * Math.PI * Math.PI * offsetHz * offsetHz);
    expect(height(1) / height(0)).toBeCloseTo(0.5, 14);
  });

  it('puts a shift above the carrier at a positive frequency', () => {
    // By hand: (5 - 4.7) ppm x 500 Hz/ppm = 150 Hz.
    expect(hertzFromShift(partsPerMillion(5), partsPerMillion(4.7), megahertz(500))).toBeCloseTo(150, 10);
  });
});

describe('shift scales', () => {
  // REFERENCE section 2, computed values of the published relation.
  it.each([
    [2, -0.00002],
    [4, -0.00173],
    [5, -0.0095],
    [6, -0.01727],
    [7, -0.01881],
  ])('puts TSP at pH %d to %d ppm on the DSS scale', (pH, expected) => {
    expect(convertShift(partsPerMillion(0), { from: 'TSP', to: 'DSS' }, pH)).toBeCloseTo(expected, 5);
  });

  it('keeps both zeros together in strong acid and 0.019 ppm apart in strong base', () => {
    const zeroAt = (pH: number) => convertShift(partsPerMillion(0), { from: 'TSP', to: 'DSS' }, pH);
    expect(zeroAt(-400)).toBeCloseTo(0, 12);
    expect(zeroAt(400)).toBeCloseTo(-0.019, 12);
  });

  it('refuses a pH that is no number', () => {
    expect(() => convertShift(partsPerMillion(0), { from: 'TSP', to: 'DSS' }, Number.NaN)).toThrow(UnitError);
  });

  it('comes back to where it was', () => {
    const there = convertShift(partsPerMillion(1.9), { from: 'DSS', to: 'TSP' }, 6);
    expect(convertShift(there, { from: 'TSP', to: 'DSS' }, 6)).toBeCloseTo(1.9, 12);
  });

  // REFERENCE section 6: Gottlieb at 20, 25, 37 C.
  it.each([
    [20, 4.82444],
    [25, 4.76819],
    [37, 4.63749],
  ])('puts water at %d degrees to %d ppm', (temperature, expected) => {
    expect(waterShift(celsius(temperature))).toBeCloseTo(expected, 5);
  });
});
