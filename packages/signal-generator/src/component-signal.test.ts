import { describe, expect, it } from 'vitest';
import { addComponentSignal, type GeneratedIsotopologue, type GeneratedSampling } from './component-signal.ts';

const SAMPLING: GeneratedSampling = { sampleCount: 400, dwellSeconds: 1 / 2000, timeZeroSamples: 0 };
const UNDAMPED = { responseFactor: 1, decayPerSecond: 0 };

type Pair = readonly [a: number, b: number, couplingHz: number];

function system(shiftsHz: readonly number[], pairs: readonly Pair[]): GeneratedIsotopologue {
  const spins = shiftsHz.map((shiftHz) => ({ shiftHz, group: 0 }));
  return { amount: 1, spins, couplings: pairs.map(([a, b, couplingHz]) => ({ a, b, couplingHz })), groups: [UNDAMPED] };
}

function signalOf(component: GeneratedIsotopologue, sampling = SAMPLING): Float64Array {
  const signal = new Float64Array(2 * sampling.sampleCount);
  addComponentSignal(component, sampling, signal);
  return signal;
}

function largestDifference(a: Float64Array, b: Float64Array): number {
  return a.reduce((worst, value, i) => Math.max(worst, Math.abs(value - b[i])), 0);
}

/** Rounding of about 400 steps of products of order 1. */
const ROUNDING = 1e-11;

describe('addComponentSignal against published line lists', () => {
  // REFERENCE section 1 (closed forms of Pople, Schneider & Bernstein 1959, composite particles of Corio 1966; ABC and AA'BB' by
  // diagonalisation): Hz and amplitude, of which n 2^(n-1) make n protons; printed to 4 and 5 decimals.
  const rows: [name: string, component: GeneratedIsotopologue, lines: [frequencyHz: number, amplitude: number][]][] = [
    [
      'AB2',
      system(
        [110, 100, 100],
        [
          [0, 1, 8],
          [0, 2, 8],
        ],
      ),
      // biome-ignore format: a published table
      [[84.5969, 0.01245], [92.5969, 0.48487], [97.4031, 1.20978], [102, 2.77778], [102.5969, 3.50268], [105.4031, 2.51513], [110, 1], [115.4031, 0.27509], [120, 0.22222]],
    ],
    [
      'A2B2, whose coupling of like protons does not show',
      system(
        [120, 120, 100, 100],
        [
          [0, 1, 17],
          [0, 2, 7],
          [0, 3, 7],
          [1, 2, 7],
          [1, 3, 7],
        ],
      ),
      // biome-ignore format: a published table
      [[69.0182, 0.00100], [81.5505, 0.00884], [90.7934, 0.85308], [93.4313, 1.12772], [96.3257, 1.17048], [99.2612, 1.71651], [100, 4], [104.7934, 3.14692], [105.9636, 3.97544], [114.0364, 3.97544], [115.2066, 3.14692], [120, 4], [120.7388, 1.71651], [123.6743, 1.17048], [126.5687, 1.12772], [129.2066, 0.85308], [138.4495, 0.00884], [150.9818, 0.00100]],
    ],
    [
      'ABC',
      system(
        [365, 352, 340],
        [
          [0, 1, 11.8],
          [0, 2, 17.9],
          [1, 2, 0.9],
        ],
      ),
      // biome-ignore format: a published table
      [[316.8875, 0.02349], [326.9529, 0.40683], [330.6144, 0.37538], [342.8601, 0.05135], [342.9410, 0.82243], [346.5216, 0.83431], [346.6025, 1.97721], [353.8105, 2.69591], [356.5870, 2.54182], [356.6679, 0.40944], [357.4720, 0.78960], [367.5374, 0.26652], [372.5751, 0.55774], [383.4446, 0.01478], [383.5255, 0.23319]],
    ],
    [
      'A3B',
      system(
        [100, 100, 100, 120],
        [
          [0, 3, 7.3],
          [1, 3, 7.3],
          [2, 3, 7.3],
        ],
      ),
      // biome-ignore format: a published table
      [[72.5760, 0.00237], [78.6585, 0.01230], [93.7395, 1.48663], [95.7047, 1.31425], [96.5794, 2.80848], [97.3381, 2.36231], [102.2571, 3.63532], [102.6619, 5.17686], [103.0047, 2.68575], [103.4206, 4.50106], [111.6605, 2.51337], [116.9953, 2.68575], [121.3415, 0.67816], [124.2953, 1.31425], [127.4240, 0.45846], [132.3429, 0.36468]],
    ],
    [
      "AA'BB'",
      system(
        [30, 30, 0, 0],
        [
          [0, 1, 8],
          [0, 2, 7],
          [0, 3, 0.5],
          [1, 2, 0.5],
          [1, 3, 7],
          [2, 3, 2],
        ],
      ),
      // biome-ignore format: a published table
      [[-27.4556, 0.00004], [-11.1433, 0.08517], [-7.7140, 0.20195], [-4.2398, 1.50176], [-4.2116, 1.51493], [-1.8553, 1.46260], [-1.3508, 1.66533], [0.4276, 1.85845], [1.1319, 1.79805], [3.2884, 2.48507], [3.4677, 2.54145], [6.9906, 0.53740], [10.2200, 0.34781], [19.7800, 0.34781], [23.0094, 0.53740], [26.5323, 2.54145], [26.7116, 2.48507], [28.8681, 1.79805], [29.5724, 1.85845], [31.3508, 1.66533], [31.8553, 1.46260], [34.2116, 1.51493], [34.2398, 1.50176], [37.7140, 0.20195], [41.1433, 0.08517], [57.4556, 0.00004]],
    ],
  ];

  it.each(rows)('makes the lines of %s', (_, component, lines) => {
    const signal = signalOf(component);
    const perProton = 1 << (component.spins.length - 1);
    const total = lines.reduce((sum, [, amplitude]) => sum + amplitude, 0);
    for (let n = 0; n < SAMPLING.sampleCount; n += 1) {
      const seconds = n * SAMPLING.dwellSeconds;
      let re = signal[2 * n];
      let im = signal[2 * n + 1];
      for (const [frequency, amplitude] of lines) {
        re -= (amplitude / perProton) * Math.cos(2 * Math.PI * frequency * seconds);
        im -= (amplitude / perProton) * Math.sin(2 * Math.PI * frequency * seconds);
      }
      // Half a unit of the last printed place: of the frequencies, and of the amplitudes.
      const printed = total * 2 * Math.PI * 0.5e-4 * seconds + lines.length * 0.5e-5;
      expect(Math.hypot(re, im)).toBeLessThan(printed / perProton + ROUNDING);
    }
  });
});

describe('addComponentSignal against closed forms', () => {
  it('gives each proton of an AB pair its own weights, response and decay', () => {
    // By hand, tan 2x = J/d, D = sqrt(d^2 + J^2), m the mean; |2> = cos x |ab> + sin x |ba>, |3> = cos x |ba> - sin x |ab>.
    // <lower|I_A-|upper><lower|F-|upper>: (1 + c + s)/2, (1 - c + s)/2, (1 + c - s)/2, (1 - c - s)/2, c = cos 2x, s = sin 2x;
    // B has -c; the four sum to 2 = Tr[I+ I-], which is divided out.
    const [a, b, j] = [110, 100, 8];
    const distance = Math.hypot(a - b, j);
    const mean = (a + b) / 2;
    const c = (a - b) / distance;
    const s = j / distance;
    const lines = [
      [mean + (distance - j) / 2, 1, 1],
      [mean - (distance - j) / 2, -1, 1],
      [mean + (distance + j) / 2, 1, -1],
      [mean - (distance + j) / 2, -1, -1],
    ];
    const groups = [
      { responseFactor: 0.8, decayPerSecond: 2 },
      { responseFactor: -0.3, decayPerSecond: 7 },
    ];
    const spins = [a, b].map((shiftHz, group) => ({ shiftHz, group }));
    const timeZeroSamples = 0.37;
    const signal = signalOf(
      { amount: 2, spins, couplings: [{ a: 0, b: 1, couplingHz: j }], groups },
      { ...SAMPLING, timeZeroSamples },
    );
    for (let n = 0; n < SAMPLING.sampleCount; n += 1) {
      const seconds = (n - timeZeroSamples) * SAMPLING.dwellSeconds;
      let re = signal[2 * n];
      let im = signal[2 * n + 1];
      for (const [frequency, signOfC, signOfS] of lines) {
        groups.forEach(({ responseFactor, decayPerSecond }, g) => {
          const weight = (1 + (g === 0 ? signOfC : -signOfC) * c + signOfS * s) / 4;
          const size = 2 * responseFactor * weight * Math.exp(-decayPerSecond * seconds);
          re -= size * Math.cos(2 * Math.PI * frequency * seconds);
          im -= size * Math.sin(2 * Math.PI * frequency * seconds);
        });
      }
      expect(Math.hypot(re, im)).toBeLessThan(ROUNDING);
    }
  });

  it('leaves one line where all shifts are equal, whatever couples', () => {
    // Isotropic couplings commute with F- (REFERENCE section 1, reductions).
    const equal = signalOf(
      system(
        [77, 77, 77, 77],
        [
          [0, 1, 30],
          [1, 2, -14],
          [0, 3, 5.5],
        ],
      ),
    );
    const one = signalOf({ ...system([77], []), amount: 4 });
    expect(largestDifference(equal, one)).toBeLessThan(ROUNDING);
  });

  it('does not tell the sign of J in AB, AB2 or A3B', () => {
    for (const likeCount of [1, 2, 3]) {
      const shifts = [120, ...Array.from({ length: likeCount }, () => 100)];
      const withSign = (sign: number) =>
        system(
          shifts,
          shifts.slice(1).map((_, b): Pair => [0, b + 1, sign * 7.3]),
        );
      expect(largestDifference(signalOf(withSign(1)), signalOf(withSign(-1)))).toBeLessThan(ROUNDING);
    }
  });

  it('gives the conjugate signal when all shifts change sign', () => {
    const pairs: Pair[] = [
      [0, 1, 11.8],
      [0, 2, 17.9],
      [1, 2, 0.9],
    ];
    const there = signalOf(system([65, 52, 40], pairs));
    const mirrored = signalOf(system([-65, -52, -40], pairs)).map((value, i) => (i % 2 === 0 ? value : -value));
    expect(largestDifference(there, mirrored)).toBeLessThan(ROUNDING);
  });

  it('keeps the published moments, of which the fourth is the first to see J', () => {
    // REFERENCE section 2: n 4, M1 77.625, central M2 1113.921875, M3 -2631.12891, M4 2002997.2900. S = n sum (2 pi i)^k M_k t^k / k!.
    const mean = 77.625;
    const dwellSeconds = 1 / 3600;
    const signal = signalOf(
      system(
        [120, 97, 60.5, 33].map((shift) => shift - mean),
        [
          [0, 1, 7],
          [0, 2, -12.5],
          [0, 3, 1.1],
          [1, 2, 4.4],
          [1, 3, 9.9],
          [2, 3, 15.2],
        ],
      ),
      { sampleCount: 9, dwellSeconds, timeZeroSamples: 4 },
    );
    const part = (k: number) => signal.filter((_, i) => i % 2 === k);
    // Central differences on nine points (Fornberg, Math. Comp. 51 (1988) 699, table 1; coefficients from memory).
    const stencils = [
      [1 / 280, -4 / 105, 1 / 5, -4 / 5, 0, 4 / 5, -1 / 5, 4 / 105, -1 / 280],
      [-1 / 560, 8 / 315, -1 / 5, 8 / 5, -205 / 72, 8 / 5, -1 / 5, 8 / 315, -1 / 560],
      [-7 / 240, 3 / 10, -169 / 120, 61 / 30, 0, -61 / 30, 169 / 120, -3 / 10, 7 / 240],
      [7 / 240, -2 / 5, 169 / 60, -122 / 15, 91 / 8, -122 / 15, 169 / 60, -2 / 5, 7 / 240],
    ];
    const derivative = (values: Float64Array, order: number) =>
      stencils[order - 1].reduce((sum, weight, n) => sum + weight * values[n], 0) /
      [1, 2, 3, 4].slice(0, order).reduce((product) => product * 2 * Math.PI * dwellSeconds, 4);
    const [m1, m3] = [derivative(part(1), 1), -derivative(part(1), 3)];
    const [m2, m4] = [-derivative(part(0), 2), derivative(part(0), 4)];
    // Lines reach 2 pi 60 Hz / 3600 Hz = 0.1 rad a step: eighth and sixth powers of it, with the stencils' factors, lie below 1e-7.
    expect(Math.abs(m1)).toBeLessThan(1e-6 * 33.4);
    expect(Math.abs(m2 / 1113.921875 - 1)).toBeLessThan(1e-6);
    expect(Math.abs(m3 + 2631.12891)).toBeLessThan(1e-6 * 33.4 * 33.4 * 33.4);
    expect(Math.abs(m4 / 2002997.29 - 1)).toBeLessThan(1e-6);
  });
});

describe('addComponentSignal as a kernel', () => {
  it('adds to what is there, leaves its input as it was, and repeats itself to the byte', () => {
    const component = system([10, 40], [[0, 1, 7]]);
    const before = structuredClone(component);
    const once = signalOf(component);
    const twice = signalOf(component);
    expect(twice).toEqual(once);
    addComponentSignal(component, SAMPLING, twice);
    expect(
      largestDifference(
        twice,
        once.map((value) => 2 * value),
      ),
    ).toBeLessThan(ROUNDING);
    expect(component).toEqual(before);
  });
});
