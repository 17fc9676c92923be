import { describe, expect, it } from 'vitest';
import { fieldFromProtonFrequency, protonFrequencyFromField, zeroFrequency } from './field.ts';
import {
  FREQUENCY_RATIOS_DSS,
  FREQUENCY_RATIOS_TMS,
  SHIELDED_PROTON_MEGAHERTZ_PER_TESLA,
} from './physical-constants.ts';
import { hertz, megahertz, seconds, tesla } from './quantities.ts';

describe('proton frequency and field', () => {
  it('gives the frequency of water at 14.1 T that CODATA 2022 gives', () => {
    // 42.57638543 MHz/T x 14.1 T = 600.327035 MHz (printed to 1 Hz).
    expect(protonFrequencyFromField(tesla(14.1))).toBeCloseTo(600.327035, 6);
  });

  it('holds the same ratio in MHz/T and in rad/s/T', () => {
    // CODATA 2022 prints both: 2.675153194(11)e8 rad/s/T.
    const radPerSecondPerTesla = 2 * Math.PI * 1e6 * SHIELDED_PROTON_MEGAHERTZ_PER_TESLA;
    expect(Math.abs(radPerSecondPerTesla - 2.675153194e8)).toBeLessThan(1);
  });

  it('comes back to the field it began with', () => {
    expect(fieldFromProtonFrequency(protonFrequencyFromField(tesla(11.7467)))).toBeCloseTo(11.7467, 13);
  });

  it('takes neither a frequency for a field nor a delay for a frequency', () => {
    // @ts-expect-error a frequency is not a field
    protonFrequencyFromField(megahertz(600));
    // @ts-expect-error Hz are not MHz
    fieldFromProtonFrequency(hertz(600e6));
    // @ts-expect-error a delay is not a frequency
    fieldFromProtonFrequency(seconds(600));
    // @ts-expect-error a plain number has no unit
    expect(protonFrequencyFromField(1)).toBe(SHIELDED_PROTON_MEGAHERTZ_PER_TESLA);
  });
});

describe('zeros of other nuclei', () => {
  const zero = megahertz(600.13);

  it('lie where the ratios of Wishart 1995 put them at 600.13 MHz', () => {
    // Computed from the published ratios, to 1 Hz.
    expect(zeroFrequency(zero, FREQUENCY_RATIOS_DSS['13C'])).toBeCloseTo(150.902406, 6);
    expect(zeroFrequency(zero, FREQUENCY_RATIOS_DSS['15N'])).toBeCloseTo(60.810644, 6);
  });

  it('differ between the two recommendations by the published scale offsets', () => {
    // 13C: 2.665 ppm (1H zeros taken equal). 15N: 380.46 ppm with these ratios; the text of IUPAC 2001 has 380.5 (from memory).
    const offsetPpm = (nucleus: '13C' | '15N') =>
      1e6 * (FREQUENCY_RATIOS_TMS[nucleus] / FREQUENCY_RATIOS_DSS[nucleus] - 1);
    expect(offsetPpm('13C')).toBeCloseTo(2.665, 3);
    expect(offsetPpm('15N')).toBeCloseTo(380.46, 2);
  });
});
