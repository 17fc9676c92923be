import type { Amount } from '@spinassay/contract';
import type { CompoundAnswer, Estimate } from '@spinassay/spectrum-inference';
import type { AnalysisRequest } from './analysis-request.ts';

/** Coverage factor of the expanded uncertainty (JCGM 100, about 95 %). */
const COVERAGE_FACTOR = 2;

/**
 * The amount concentration in the tube: analyte over standard, times the standard's concentration.
 *
 * Combined by JCGM 100: relative variances of the fit and of the standard add; no correlation between them.
 *
 * @returns undefined without a preparation whose standard the method counts against
 */
export function amountOf(
  request: AnalysisRequest,
  compound: CompoundAnswer,
  perStandard: Estimate | undefined,
): Amount | undefined {
  const standard = request.preparation?.standard;
  if (standard === undefined || perStandard === undefined) return undefined;
  if (standard.compoundId !== request.method.standard?.compoundId) return undefined;
  const { value, standardUncertainty, unit } = standard.amountConcentration;
  const limit = compound.upperLimitOverReference;
  const raw = perStandard.value * value;
  const fitRelative = perStandard.sd / Math.abs(perStandard.value);
  const standardRelative = standardUncertainty / value;
  const combined = Math.hypot(perStandard.sd * value, perStandard.value * standardUncertainty);
  const expanded = COVERAGE_FACTOR * combined;
  return {
    species: compound.id,
    quantityKind: 'amount-concentration',
    basis: 'tube',
    unit,
    rawEstimate: raw,
    comparator: limit === undefined ? '=' : '<',
    posterior: {
      value: raw,
      sd: perStandard.sd * value,
      low95: perStandard.low95 * value,
      high95: perStandard.high95 * value,
      unit,
    },
    combinedStandardUncertainty: combined,
    coverageFactor: COVERAGE_FACTOR,
    expandedUncertainty: expanded,
    budget: [
      { source: 'fit of this signal', standardUncertaintyRelative: fitRelative },
      { source: 'concentration of the standard', standardUncertaintyRelative: standardRelative },
    ],
    reported: limit === undefined ? reported(raw, expanded, unit) : `< ${(limit * value).toPrecision(2)} ${unit}`,
  };
}

/** Rounded once: the uncertainty to two significant digits, the value to the same place. */
export function reported(value: number, expanded: number, unit: string): string {
  if (!(expanded > 0)) return `${value} ${unit}`;
  const exponent = Math.floor(Math.log10(expanded));
  const places = 1 - exponent;
  // Rounding 0.0996 to two digits carries into the next place.
  const carried = Number(expanded.toPrecision(2)) >= 10 * Number(`1e${exponent}`) ? places - 1 : places;
  const show = (x: number): string =>
    carried >= 0
      ? x.toFixed(Math.min(carried, 20))
      : String(Math.round(x / Number(`1e${-carried}`)) * Number(`1e${-carried}`));
  return `(${show(value)} ± ${show(expanded)}) ${unit}`;
}
