import type { BinWindows } from './bin-windows.ts';
import { type ParameterLayout, parameterValues } from './parameter-layout.ts';
import { envelopeColumns } from './shared-envelope.ts';
import type { SpectrumModel } from './spectrum-model.ts';
import type { UsableSignal } from './time-ladder.ts';

/** Where a model is linearised: parameters, amounts and envelope. */
export interface FitPlace {
  /** (P) standardised. */
  readonly standardised: Float64Array;
  /** (C) signal of one proton at time zero. */
  readonly amounts: Float64Array;
  /** (E) u_k, then v_k. */
  readonly envelope: Float64Array;
}

/** The model about one place as a linear function of parameters, amounts and envelope, not whitened. */
export interface LinearisedFit extends FitPlace {
  readonly layout: ParameterLayout;
  readonly bins: BinWindows;
  /** (2 binCount) data less model. */
  readonly residual: Float64Array;
  /** P + C + E columns of (2 binCount). */
  readonly columns: readonly Float64Array[];
}

/**
 * Linearise the model. The envelope multiplies the whole model; its own change of the parameter columns, of second order, is
 * left out: rounds of relinearising put it right.
 */
export function linearise(
  model: SpectrumModel,
  bins: BinWindows,
  signal: UsableSignal,
  place: FitPlace,
): LinearisedFit {
  const { layout } = model;
  const { standardised, amounts, envelope } = place;
  const values = parameterValues(layout, standardised);
  const make = (): Float64Array => new Float64Array(2 * bins.binCount);
  const derivatives = layout.parameters.map(make);
  const compounds = layout.compounds.map(make);
  model.derivativeColumnsInto(values, amounts, bins, derivatives);
  model.compoundColumnsInto(values, bins, compounds);
  derivatives.forEach((column, p) => {
    const { unit } = layout.parameters[p];
    for (let k = 0; k < column.length; k += 1) column[k] *= unit;
  });
  const shapes = envelopeColumns(model, { values, amounts }, signal, bins);
  const residual = bins.data.slice();
  const subtract = (column: Float64Array, factor: number): void => {
    for (let k = 0; k < residual.length; k += 1) residual[k] -= factor * column[k];
  };
  compounds.forEach((column, c) => {
    subtract(column, amounts[c]);
  });
  shapes.forEach((column, e) => {
    if (envelope[e] !== 0) subtract(column, envelope[e]);
  });
  return { layout, bins, ...place, residual, columns: [...derivatives, ...compounds, ...shapes] };
}

/** The data less the residual: what the model says, without baseline. */
export function modelOf(fit: LinearisedFit): Float64Array {
  return fit.bins.data.map((value, k) => value - fit.residual[k]);
}
