import { type GeneratedMeasurement, generateMeasurement } from './generate-measurement.ts';

/** The samples of `generateMeasurement` alone, (2 sampleCount) interleaved: what an instrument would hand over. */
export function generateSignal(measurement: GeneratedMeasurement): Float64Array {
  return generateMeasurement(measurement).samples;
}
