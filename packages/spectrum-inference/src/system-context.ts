import type { SystemLines } from './compound-lines.ts';
import type { LineField } from './line-field.ts';
import type { ParameterLayout, SystemPlaces } from './parameter-layout.ts';

/** One spin system at one place of parameter space, ready to be put into bins. */
export interface SystemContext {
  readonly layout: ParameterLayout;
  readonly system: SystemLines;
  readonly places: SystemPlaces;
  readonly compound: number;
  readonly values: Float64Array;
  readonly shiftsHz: Float64Array;
  readonly couplingsHz: Float64Array;
  readonly lineWeightMin: number;
  readonly leadSamples: number;
  readonly field: LineField;
}

/** Decay rate of a group's line at a frequency, the share of the sample's field included. */
export function decayOf(context: SystemContext, group: number, frequencyHz: number): number {
  const { layout, places, values, field } = context;
  const decay = Math.exp(values[places.logDecay + group]);
  if (layout.intensityBroadening < 0) return decay;
  return Math.max(0, decay + values[layout.intensityBroadening] * field(frequencyHz));
}
