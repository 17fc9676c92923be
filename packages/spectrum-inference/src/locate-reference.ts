import type { TaperedSpectrum } from '@spinassay/signal-processing';

/** Where the reference may stand about its declared place, and how strong it must be (REAL-DATA section 9). */
const REACH_PPM = 0.1;
const SIGNAL_TO_NOISE_MIN = 50;
/** A partner of comparable height this close makes it a multiplet, not a reference. */
const PARTNER_REACH_HZ = 20;
const PARTNER_SHARE_MAX = 0.3;
/** A single line falls below this share of its height within this distance: apart from it partners count. */
const OWN_WIDTH_HZ = 4;

export interface LocatedReference {
  readonly isFound: boolean;
  readonly frequencyHz: number;
  readonly signalToNoise: number;
  /** Why it was not taken; empty when found. */
  readonly trouble: '' | 'too-weak' | 'not-a-singlet';
}

/** Take the largest singlet near the declared zero, if it is strong enough and alone. */
export function locateReference(
  spectrum: TaperedSpectrum,
  noiseSd: number,
  declaredZeroHz: number,
  hertzPerPpm: number,
): LocatedReference {
  const reach = REACH_PPM * hertzPerPpm;
  let best = 0;
  let frequencyHz = declaredZeroHz;
  eachBin(spectrum, declaredZeroHz, reach, (frequency, size) => {
    if (size > best) {
      best = size;
      frequencyHz = frequency;
    }
  });
  const signalToNoise = best / noiseSd;
  let partner = 0;
  eachBin(spectrum, frequencyHz, PARTNER_REACH_HZ, (frequency, size) => {
    if (Math.abs(frequency - frequencyHz) > OWN_WIDTH_HZ) partner = Math.max(partner, size);
  });
  const trouble =
    signalToNoise < SIGNAL_TO_NOISE_MIN ? 'too-weak' : partner > PARTNER_SHARE_MAX * best ? 'not-a-singlet' : '';
  return { isFound: trouble === '', frequencyHz, signalToNoise, trouble };
}

function eachBin(
  spectrum: TaperedSpectrum,
  centreHz: number,
  reachHz: number,
  visit: (frequencyHz: number, size: number) => void,
): void {
  for (let place = 0; place < spectrum.binCount; place += 1) {
    const frequency = spectrum.frequencyHz[place];
    if (Math.abs(frequency - centreHz) > reachHz) continue;
    visit(frequency, Math.hypot(spectrum.bins[2 * place], spectrum.bins[2 * place + 1]));
  }
}
