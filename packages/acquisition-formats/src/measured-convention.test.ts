import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { describeWithReferenceData } from '../../../tests/reference-data.ts';
import { type ReadAcquisition, readAcquisition } from './read-acquisition.ts';

/** Half-width of a searched window: more than the 0.02 ppm between the TSP and DSS scales, less than a gap. */
const WINDOW_PPM = 0.05;
/** A place without a signal holds noise and tails; house margin, far below any of the four signals. */
const CONTRAST_MIN = 10;

/** |sum of s_k exp(-2 pi i f t_k)| at one frequency, written out so that no transform of ours is trusted. */
function magnitudeAt({ samples, sampleCount, dwellSeconds }: ReadAcquisition, frequencyHz: number): number {
  let [real, imaginary] = [0, 0];
  for (let index = 0; index < sampleCount; index += 1) {
    const angle = -2 * Math.PI * frequencyHz * index * dwellSeconds;
    const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
    const [re, im] = [samples[2 * index] ?? Number.NaN, samples[2 * index + 1] ?? Number.NaN];
    real += re * cosine - im * sine;
    imaginary += re * sine + im * cosine;
  }
  return Math.hypot(real, imaginary);
}

function largestNear(acquisition: ReadAcquisition, shiftPpm: number): number {
  const { referenceFrequencyMHz = Number.NaN } = acquisition.declared;
  const carrierHz = 1e6 * (acquisition.observeFrequencyMHz - referenceFrequencyMHz);
  const stepHz = 1 / (acquisition.sampleCount * acquisition.dwellSeconds);
  const halfWidthHz = WINDOW_PPM * referenceFrequencyMHz;
  let largest = 0;
  for (let offsetHz = -halfWidthHz; offsetHz <= halfWidthHz; offsetHz += stepHz) {
    largest = Math.max(largest, magnitudeAt(acquisition, shiftPpm * referenceFrequencyMHz + offsetHz - carrierHz));
  }
  return largest;
}

describeWithReferenceData('the convention of signs, against a measured sample', (folder) => {
  const reading = readAcquisition(readFileSync(join(folder, 'GABA_500MHz_D2O_fid.jdx')));

  // 4-aminobutyric acid with TSP: Dashti et al., Anal. Chem. 89 (2017) 12201, BMRB bmse000871; TSP is 0 ppm by definition.
  test.each([0, 1.8933, 2.2861, 2.9974])('puts a signal at %d ppm and none at its mirror image', (shiftPpm) => {
    if (!reading.ok) expect.fail(JSON.stringify(reading.faults));
    const { acquisition } = reading;
    const mirroredPpm = 2 * (acquisition.declared.carrierPpm ?? Number.NaN) - shiftPpm;
    expect(largestNear(acquisition, shiftPpm)).toBeGreaterThan(CONTRAST_MIN * largestNear(acquisition, mirroredPpm));
  });
});
