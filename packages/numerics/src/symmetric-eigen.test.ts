import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { DomainError } from './errors.ts';
import { createRandomStream } from './random-stream.ts';
import { createEigenWorkspace, symmetricEigenInto } from './symmetric-eigen.ts';

const random = createRandomStream({ seed: 3n, purpose: 'eigen test' });

function randomSymmetric(size: number, scale = 1): Float64Array {
  const matrix = new Float64Array(size * size);
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j <= i; j += 1) {
      matrix[i * size + j] = scale * random.nextNormal();
      matrix[j * size + i] = matrix[i * size + j];
    }
  }
  return matrix;
}

function decompose(size: number, matrix: Float64Array): { values: Float64Array; vectors: Float64Array } {
  const values = new Float64Array(size);
  const vectors = new Float64Array(size * size);
  symmetricEigenInto(size, matrix, values, vectors, createEigenWorkspace(size));
  return { values, vectors };
}

/** Largest |A v - lambda v| and |v'w - delta| over all pairs. */
function defects(size: number, matrix: Float64Array): { residual: number; orthogonality: number } {
  const { values, vectors } = decompose(size, matrix);
  let residual = 0;
  let orthogonality = 0;
  for (let k = 0; k < size; k += 1) {
    for (let i = 0; i < size; i += 1) {
      let sum = -values[k] * vectors[k * size + i];
      let inner = k === i ? -1 : 0;
      for (let j = 0; j < size; j += 1) {
        sum += matrix[i * size + j] * vectors[k * size + j];
        inner += vectors[k * size + j] * vectors[i * size + j];
      }
      residual = Math.max(residual, Math.abs(sum));
      orthogonality = Math.max(orthogonality, Math.abs(inner));
    }
  }
  return { residual, orthogonality };
}

describe('symmetricEigenInto', () => {
  it('solves the two by two matrix done by hand', () => {
    const { values } = decompose(2, Float64Array.of(2, 1, 1, 2));
    expect([...values].sort()).toEqual([expect.closeTo(1, 14), expect.closeTo(3, 14)]);
  });

  it.each([1, 2, 3, 6, 10, 20, 35, 70])('agrees with ml-matrix for %d rows', (size) => {
    const matrix = randomSymmetric(size);
    const oracle = new EigenvalueDecomposition(
      new Matrix(Array.from({ length: size }, (_, i) => [...matrix.subarray(i * size, (i + 1) * size)])),
      { assumeSymmetric: true },
    );
    const expected = Float64Array.from(oracle.realEigenvalues).sort();
    const found = decompose(size, matrix).values.sort();
    const scale = Math.max(...expected.map(Math.abs));
    found.forEach((value, k) => {
      expect(Math.abs(value - expected[k])).toBeLessThan(1e-12 * scale);
    });
  });

  // Backward stable: defects stay within a modest multiple of size times rounding, whatever the scale.
  it.each([
    ['random', randomSymmetric(50)],
    ['tiny', randomSymmetric(50, 1e-9)],
    ['huge', randomSymmetric(50, 1e9)],
    ['zero', new Float64Array(2500)],
    ['constant', new Float64Array(2500).fill(1)],
    ['diagonal with ties', Float64Array.from({ length: 2500 }, (_, i) => (i % 51 === 0 ? Math.floor(i / 204) : 0))],
  ])('has small defects on a %s matrix', (_, matrix) => {
    const scale = matrix.reduce((largest, x) => Math.max(largest, Math.abs(x)), 0);
    const { residual, orthogonality } = defects(50, matrix);
    expect(residual).toBeLessThanOrEqual(50 * 50 * Number.EPSILON * scale);
    expect(orthogonality).toBeLessThan(50 * 50 * Number.EPSILON);
  });

  it('leaves its input alone and gives the same bytes from a used workspace', () => {
    const matrix = randomSymmetric(12);
    const before = matrix.slice();
    const workspace = createEigenWorkspace(20);
    const run = (): Float64Array => {
      const vectors = new Float64Array(144);
      symmetricEigenInto(12, matrix, new Float64Array(12), vectors, workspace);
      return vectors;
    };
    const first = run();
    symmetricEigenInto(20, randomSymmetric(20), new Float64Array(20), new Float64Array(400), workspace);
    expect(run()).toEqual(first);
    expect(matrix).toEqual(before);
  });

  it('refuses a value that is not finite, wherever it stands', () => {
    for (const size of [1, 2, 3, 7]) {
      for (let i = 0; i < size; i += 1) {
        for (let j = 0; j <= i; j += 1) {
          for (const value of [Number.NaN, Number.POSITIVE_INFINITY]) {
            const matrix = randomSymmetric(size);
            matrix[i * size + j] = value;
            matrix[j * size + i] = value;
            expect(() => decompose(size, matrix)).toThrow(DomainError);
          }
        }
      }
    }
  });

  it('refuses buffers that are too small', () => {
    expect(() =>
      symmetricEigenInto(3, new Float64Array(9), new Float64Array(2), new Float64Array(9), createEigenWorkspace(3)),
    ).toThrow('expected buffers');
  });
});
