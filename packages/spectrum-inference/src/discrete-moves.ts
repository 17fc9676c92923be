import type { RandomStream } from '@spinassay/numerics';
import type { ParameterLayout } from './parameter-layout.ts';

/** Size of a kick that leaves a saddle where two couplings are equal, Hz (SEARCH section 1: equal priors stick). */
const SADDLE_KICK_HZ = 1;

/**
 * One discrete change that a climb cannot make by itself: within one system swap two couplings, split two of them apart,
 * swap two shifts of groups of equal size, or move one shift to another place of its prior.
 *
 * @returns a new vector; where the layout has nothing to swap, a shift is redrawn
 * @source INFERENCE.md, search step 5; the shares are those measured there, without sign flips: routine priors hold the signs
 */
export function proposeMove(layout: ParameterLayout, standardised: Float64Array, random: RandomStream): Float64Array {
  const moved = standardised.slice();
  const choice = random.nextUniform();
  const couplings = pickPair(layout, 'coupling', random);
  const shifts = pickPair(layout, 'shift', random);
  if (choice < 0.35 && couplings !== undefined) swapValues(layout, moved, couplings);
  else if (choice < 0.6 && couplings !== undefined) {
    const [a, b] = couplings;
    moved[a] -= SADDLE_KICK_HZ / layout.parameters[a].unit;
    moved[b] += SADDLE_KICK_HZ / layout.parameters[b].unit;
  } else if (choice < 0.8 && shifts !== undefined) swapValues(layout, moved, shifts);
  else {
    const place = pickOne(layout, 'shift', random);
    if (place !== undefined) moved[place] = random.nextNormal();
  }
  return moved;
}

function pickOne(layout: ParameterLayout, kind: 'shift' | 'coupling', random: RandomStream): number | undefined {
  const places = layout.parameters.flatMap((parameter, p) =>
    parameter.kind === kind && parameter.unit > 0 ? [p] : [],
  );
  return places.length === 0 ? undefined : places[random.nextInteger(places.length)];
}

/** Two parameters of one kind in one system. */
function pickPair(
  layout: ParameterLayout,
  kind: 'shift' | 'coupling',
  random: RandomStream,
): readonly [number, number] | undefined {
  const first = pickOne(layout, kind, random);
  if (first === undefined) return undefined;
  const chosen = layout.parameters[first];
  const partners = layout.parameters.flatMap((parameter, p) =>
    p !== first &&
    parameter.kind === kind &&
    parameter.unit > 0 &&
    parameter.compound === chosen.compound &&
    parameter.system === chosen.system
      ? [p]
      : [],
  );
  return partners.length === 0 ? undefined : [first, partners[random.nextInteger(partners.length)]];
}

function swapValues(layout: ParameterLayout, moved: Float64Array, [a, b]: readonly [number, number]): void {
  const value = (p: number): number => layout.parameters[p].mean + layout.parameters[p].unit * moved[p];
  const first = value(a);
  const second = value(b);
  moved[a] = (second - layout.parameters[a].mean) / layout.parameters[a].unit;
  moved[b] = (first - layout.parameters[b].mean) / layout.parameters[b].unit;
}
