import { type DampedLine, lineResponseInto } from '@spinassay/signal-processing';
import type { BinWindow, BinWindows } from './bin-windows.ts';
import { addScaled } from './column-sums.ts';
import { createSystemLines } from './compound-lines.ts';
import { createLineField, type LineField } from './line-field.ts';
import type { ParameterLayout } from './parameter-layout.ts';
import { decayOf, type SystemContext } from './system-context.ts';
import { addSystemDerivatives } from './system-derivatives.ts';

/**
 * The model of a spectrum: B_c = exp(i phase) sum over the lines of compound c of r_g w_lg G(f_l, R_g), in the bins of windows.
 * Amounts multiply the columns B_c and are real (DESIGN section 4). Not shared between threads: it owns scratch.
 */
export interface SpectrumModel {
  readonly layout: ParameterLayout;
  /** Fill one column per compound, each (2 binCount), at the parameter values given. */
  compoundColumnsInto(values: Float64Array, bins: BinWindows, columns: readonly Float64Array[]): void;
  /** Fill d(sum_c amounts_c B_c)/d(value_p), one column per parameter. */
  derivativeColumnsInto(
    values: Float64Array,
    amounts: Float64Array,
    bins: BinWindows,
    columns: readonly Float64Array[],
  ): void;
  /** All damped lines of the model at these values; weight in protons of one molecule. */
  dampedLines(values: Float64Array): ModelLine[];
  /** Give every line the share of the sample's field that acts on it, from the model at these values; used by intensity-broadening. */
  freezeField(values: Float64Array, amounts: Float64Array): void;
}

export interface ModelLine {
  readonly compound: number;
  readonly frequencyHz: number;
  readonly decayPerSecond: number;
  readonly weight: number;
}

/** Group weights below this share of one proton are left out of the bins. */
const WEIGHT_MIN = 1e-6;

/** Compile a model for a layout. Throws SystemTooLargeError for a spin system beyond the exact engine. */
export function createSpectrumModel(layout: ParameterLayout): SpectrumModel {
  const systems = layout.compounds.map((compound) => compound.spinSystems.map(createSystemLines));
  let field: LineField = () => 0;
  const contexts = (values: Float64Array, bins: BinWindows | undefined): SystemContext[] =>
    systems.flatMap((list, compound) =>
      list.map((system, s) => ({
        layout,
        system,
        places: layout.places[compound][s],
        compound,
        values,
        shiftsHz: shiftsHzOf(layout, compound, s, values),
        couplingsHz: couplingsHzOf(layout, compound, s, values),
        lineWeightMin: bins?.lineWeightMin ?? WEIGHT_MIN,
        leadSamples: (bins?.firstSampleIndex ?? 0) - values[layout.timeZero],
        field,
      })),
    );
  return {
    layout,
    compoundColumnsInto(values, bins, columns) {
      const value = new Float64Array(2 * bins.binCount);
      for (const column of columns) column.fill(0);
      for (const context of contexts(values, bins)) addSystemValues(context, bins, columns[context.compound], value);
      for (const column of columns) rotateInPlace(column, values[layout.phase]);
    },
    derivativeColumnsInto(values, amounts, bins, columns) {
      const scratch = { value: new Float64Array(2 * bins.binCount), slope: new Float64Array(2 * bins.binCount) };
      for (const column of columns) column.fill(0);
      for (const context of contexts(values, bins)) {
        addSystemDerivatives(context, amounts[context.compound], bins, columns, scratch);
      }
      for (const column of columns) rotateInPlace(column, values[layout.phase]);
    },
    dampedLines(values) {
      return contexts(values, undefined).flatMap(linesOf);
    },
    freezeField(values, amounts) {
      const lines = contexts(values, undefined).flatMap(linesOf);
      field = createLineField(
        lines.map(({ frequencyHz, weight, compound }) => ({ frequencyHz, size: weight * amounts[compound] })),
      );
    },
  };
}

function shiftsHzOf(layout: ParameterLayout, compound: number, system: number, values: Float64Array): Float64Array {
  const zero = layout.referencePosition < 0 ? layout.declaredZeroHz : values[layout.referencePosition];
  const { shift } = layout.places[compound][system];
  return Float64Array.from(layout.compounds[compound].spinSystems[system].groups, (_, g) =>
    shift < 0 ? zero : zero + layout.hertzPerPpm * (values[shift + g] + values[layout.commonOffset]),
  );
}

function couplingsHzOf(layout: ParameterLayout, compound: number, system: number, values: Float64Array): Float64Array {
  const { coupling } = layout.places[compound][system];
  return Float64Array.from(layout.compounds[compound].spinSystems[system].couplings, (_, j) => values[coupling + j]);
}

function linesOf(context: SystemContext): ModelLine[] {
  const { system, compound, values, places } = context;
  const groupCount = system.system.groups.length;
  const lines: ModelLine[] = [];
  system.isotopologues.forEach((isotopologue, i) => {
    const table = system.lines(i, context);
    const share = isotopologue.weight * system.system.copyCount;
    for (let l = 0; l < table.lineCount; l += 1) {
      const frequencyHz = table.frequencyHz[l];
      for (let g = 0; g < groupCount; g += 1) {
        const weight = table.groupWeight[l * groupCount + g] * share * values[places.response + g];
        if (Math.abs(weight) < WEIGHT_MIN) continue;
        lines.push({ compound, frequencyHz, weight, decayPerSecond: decayOf(context, g, frequencyHz) });
      }
    }
  });
  return lines;
}

function addSystemValues(context: SystemContext, bins: BinWindows, column: Float64Array, value: Float64Array): void {
  const { system, places, values, leadSamples } = context;
  const groupCount = system.system.groups.length;
  const line: DampedLine = { frequencyHz: 0, decayPerSecond: 0, leadSamples };
  for (let i = 0; i < system.isotopologues.length; i += 1) {
    const table = system.lines(i, context);
    const share = system.isotopologues[i].weight * system.system.copyCount;
    for (let l = 0; l < table.lineCount; l += 1) {
      line.frequencyHz = table.frequencyHz[l];
      for (let g = 0; g < groupCount; g += 1) {
        const weight = table.groupWeight[l * groupCount + g] * share * values[places.response + g];
        if (Math.abs(weight) < bins.lineWeightMin) continue;
        line.decayPerSecond = decayOf(context, g, line.frequencyHz);
        for (const window of bins.windows) {
          if (bins.valueReachHz < distance(window, line.frequencyHz)) continue;
          lineResponseInto(window.grid, line, value, undefined);
          addScaled(column, 2 * window.offset, value, 0, 2 * window.grid.binCount, weight);
        }
      }
    }
  }
}

function rotateInPlace(column: Float64Array, phaseRadians: number): void {
  const cos = Math.cos(phaseRadians);
  const sin = Math.sin(phaseRadians);
  for (let k = 0; k < column.length; k += 2) {
    const re = column[k];
    const im = column[k + 1];
    column[k] = re * cos - im * sin;
    column[k + 1] = re * sin + im * cos;
  }
}

/** How far a frequency lies outside a window, Hz; 0 inside. */
function distance(window: BinWindow, frequencyHz: number): number {
  return Math.max(0, window.lowHz - frequencyHz, frequencyHz - window.highHz);
}
