import type { BinWindows } from './bin-windows.ts';
import type { NoiseWhitener } from './noise-whitener.ts';
import { parameterValues } from './parameter-layout.ts';
import { solvePositive } from './solve-positive.ts';
import type { SpectrumModel } from './spectrum-model.ts';

/** A place in parameter space with the amounts that fit best there. */
export interface FitPoint {
  /** (P) standardised parameters. */
  readonly standardised: Float64Array;
  /** (C) amount of each compound: signal of one proton at time zero. */
  readonly amounts: Float64Array;
  /** Negative log posterior up to a constant of the noise model: (chi^2 + prior terms) / 2, nats. */
  readonly objective: number;
  /** (2 binCount) whitened residual. */
  readonly residual: Float64Array;
  /** C columns of (2 binCount), whitened. */
  readonly compoundColumns: readonly Float64Array[];
}

/** Everything that stays the same while one likelihood is climbed. */
export interface FitTarget {
  readonly model: SpectrumModel;
  readonly bins: BinWindows;
  readonly whitener: NoiseWhitener;
  /** (P) prior precision of the standardised parameters. */
  readonly precision: Float64Array;
  /** (C) prior sd of each amount, normal about 0. */
  readonly amountSd: Float64Array;
}

/** Evaluate a point: amounts are the conditional maximum (variable projection). */
export function evaluateFit(target: FitTarget, standardised: Float64Array): FitPoint {
  const { model, bins, whitener, amountSd } = target;
  const values = parameterValues(model.layout, standardised);
  const columns = Array.from(amountSd, () => new Float64Array(2 * bins.binCount));
  model.compoundColumnsInto(values, bins, columns);
  for (const column of columns) whitener.whitenInPlace(column);
  const residual = bins.data.slice();
  whitener.whitenInPlace(residual);
  const count = columns.length;
  const matrix = new Float64Array(count * count);
  const amounts = new Float64Array(count);
  for (let i = 0; i < count; i += 1) {
    amounts[i] = dot(columns[i], residual);
    for (let j = 0; j <= i; j += 1) {
      const value = dot(columns[i], columns[j]);
      matrix[i * count + j] = value;
      matrix[j * count + i] = value;
    }
    matrix[i * count + i] += 1 / (amountSd[i] * amountSd[i]);
  }
  solvePositive(matrix, amounts);
  let objective = 0;
  columns.forEach((column, c) => {
    for (let k = 0; k < residual.length; k += 1) residual[k] -= amounts[c] * column[k];
    objective += 0.5 * (amounts[c] / amountSd[c]) * (amounts[c] / amountSd[c]);
  });
  objective += 0.5 * dot(residual, residual);
  standardised.forEach((t, p) => {
    objective += t === 0 ? 0 : 0.5 * target.precision[p] * t * t;
  });
  return { standardised, amounts, objective, residual, compoundColumns: columns };
}

/** (P) whitened derivative columns of the model by each standardised parameter, at the amounts of the point. */
export function jacobianColumns(target: FitTarget, point: FitPoint): Float64Array[] {
  const { model, bins, whitener } = target;
  const columns = model.layout.parameters.map(() => new Float64Array(2 * bins.binCount));
  model.derivativeColumnsInto(parameterValues(model.layout, point.standardised), point.amounts, bins, columns);
  columns.forEach((column, p) => {
    const { unit } = model.layout.parameters[p];
    for (let k = 0; k < column.length; k += 1) column[k] *= unit;
    whitener.whitenInPlace(column);
  });
  return columns;
}

/** Inner product of two columns. */
export function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let k = 0; k < a.length; k += 1) sum += a[k] * b[k];
  return sum;
}
