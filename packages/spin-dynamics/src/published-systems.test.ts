import { describe, expect, it } from 'vitest';
import { compileSpinTopology } from './compile-spin-topology.ts';
import { computeTransitionsInto } from './compute-transitions.ts';
import type { SpinTopology } from './spin-topology.ts';
import { createTransitionTable } from './transition-table.ts';
import { createTransitionWorkspace } from './transition-workspace.ts';

type Line = readonly [number, number];

/** Lines of spins with their own shifts, amplitudes |<lower|F-|upper>|^2, degenerate lines merged, above 1e-5. */
function lines(
  spins: readonly (readonly [protonCount: number, shiftHz: number])[],
  couplings: readonly (readonly [a: number, b: number, couplingHz: number])[],
): Line[] {
  const topology: SpinTopology = {
    spins: spins.map(([protonCount], s) => ({ protonCount, groupIndex: s, shiftIndex: s })),
    groupCount: spins.length,
    shiftCount: spins.length,
    couplingCount: couplings.length,
    couplings: couplings.map(([spinA, spinB], c) => ({ spinA, spinB, couplingIndex: c })),
  };
  const compiled = compileSpinTopology(topology, { lineWeightMin: 1e-9 });
  const table = createTransitionTable(compiled);
  const shifts = Float64Array.from(spins, ([, shift]) => shift);
  const values = Float64Array.from(couplings, ([, , value]) => value);
  computeTransitionsInto(compiled, shifts, values, createTransitionWorkspace(compiled), table);
  const protons = spins.reduce((sum, [count]) => sum + count, 0);
  const merged: [number, number][] = [];
  const found = Array.from({ length: table.lineCount }, (_, l): [number, number] => {
    const weight = table.groupWeight.subarray(l * spins.length, (l + 1) * spins.length).reduce((sum, w) => sum + w, 0);
    return [table.frequencyHz[l], weight * (1 << (protons - 1))];
  }).sort((a, b) => a[0] - b[0]);
  for (const [frequency, amplitude] of found) {
    const last = merged.at(-1);
    if (last !== undefined && frequency - last[0] < MERGE_HZ) last[1] += amplitude;
    else merged.push([frequency, amplitude]);
  }
  return merged.filter(([, amplitude]) => amplitude > 1e-5);
}

/** Below the digits of the table, above J^2 / 1e7 Hz, which a far X nucleus still splits. */
const MERGE_HZ = 3e-5;

/** Rows of REFERENCE section 1: closed forms (Pople, Schneider & Bernstein 1959 ch. 6; Corio 1960) and full diagonalisation. */
const ROWS: readonly { name: string; found: () => Line[]; published: readonly Line[] }[] = [
  {
    name: 'AB',
    found: () =>
      lines(
        [
          [1, 110],
          [1, 100],
        ],
        [[0, 1, 8]],
      ),
    published: [
      [94.5969, 0.3753],
      [102.5969, 1.6247],
      [107.4031, 1.6247],
      [115.4031, 0.3753],
    ],
  },
  {
    name: 'AB2',
    found: () =>
      lines(
        [
          [1, 110],
          [2, 100],
        ],
        [[0, 1, 8]],
      ),
    published: [
      [84.5969, 0.01245],
      [92.5969, 0.48487],
      [97.4031, 1.20978],
      [102, 2.77778],
      [102.5969, 3.50268],
      [105.4031, 2.51513],
      [110, 1],
      [115.4031, 0.27509],
      [120, 0.22222],
    ],
  },
  {
    name: 'ABX, AB part and X part at 1000 Hz',
    // The X nucleus of the published row is weakly coupled: far away here, first order in (J / 1000)^2, hence the tolerance below.
    found: () =>
      lines(
        [
          [1, 20],
          [1, 8],
          [1, 1e7],
        ],
        [
          [0, 1, -12],
          [0, 2, 7],
          [1, 2, 3],
        ],
      ),
    published: [
      [-2.3102, 0.23178],
      [1.2805, 0.34921],
      [9.6898, 1.76822],
      [13.2805, 1.65079],
      [13.3102, 1.76822],
      [19.7195, 1.65079],
      [25.3102, 0.23178],
      [31.7195, 0.34921],
      [1e7 - 17.0298, 0.00699],
      [1e7 - 5, 1],
      [1e7 - 1.4093, 0.99301],
      [1e7 + 1.4093, 0.99301],
      [1e7 + 5, 1],
      [1e7 + 17.0298, 0.00699],
    ],
  },
  {
    name: 'A2B2',
    found: () =>
      lines(
        [
          [2, 120],
          [2, 100],
        ],
        [[0, 1, 7]],
      ),
    published: [
      [69.0182, 0.001],
      [81.5505, 0.00884],
      [90.7934, 0.85308],
      [93.4313, 1.12772],
      [96.3257, 1.17048],
      [99.2612, 1.71651],
      [100, 4],
      [104.7934, 3.14692],
      [105.9636, 3.97544],
      [114.0364, 3.97544],
      [115.2066, 3.14692],
      [120, 4],
      [120.7388, 1.71651],
      [123.6743, 1.17048],
      [126.5687, 1.12772],
      [129.2066, 0.85308],
      [138.4495, 0.00884],
      [150.9818, 0.001],
    ],
  },
  {
    name: 'ABC',
    found: () =>
      lines(
        [
          [1, 365],
          [1, 352],
          [1, 340],
        ],
        [
          [0, 1, 11.8],
          [0, 2, 17.9],
          [1, 2, 0.9],
        ],
      ),
    published: [
      [316.8875, 0.02349],
      [326.9529, 0.40683],
      [330.6144, 0.37538],
      [342.8601, 0.05135],
      [342.941, 0.82243],
      [346.5216, 0.83431],
      [346.6025, 1.97721],
      [353.8105, 2.69591],
      [356.587, 2.54182],
      [356.6679, 0.40944],
      [357.472, 0.7896],
      [367.5374, 0.26652],
      [372.5751, 0.55774],
      [383.4446, 0.01478],
      [383.5255, 0.23319],
    ],
  },
  {
    name: 'A3B',
    found: () =>
      lines(
        [
          [3, 100],
          [1, 120],
        ],
        [[0, 1, 7.3]],
      ),
    published: [
      [72.576, 0.00237],
      [78.6585, 0.0123],
      [93.7395, 1.48663],
      [95.7047, 1.31425],
      [96.5794, 2.80848],
      [97.3381, 2.36231],
      [102.2571, 3.63532],
      [102.6619, 5.17686],
      [103.0047, 2.68575],
      [103.4206, 4.50106],
      [111.6605, 2.51337],
      [116.9953, 2.68575],
      [121.3415, 0.67816],
      [124.2953, 1.31425],
      [127.424, 0.45846],
      [132.3429, 0.36468],
    ],
  },
  {
    name: "AA'BB'",
    found: () =>
      lines(
        [
          [1, 30],
          [1, 30],
          [1, 0],
          [1, 0],
        ],
        [
          [0, 1, 8],
          [2, 3, 2],
          [0, 2, 7],
          [1, 3, 7],
          [0, 3, 0.5],
          [1, 2, 0.5],
        ],
      ),
    published: [
      [-27.4556, 0.00004],
      [-11.1433, 0.08517],
      [-7.714, 0.20195],
      [-4.2398, 1.50176],
      [-4.2116, 1.51493],
      [-1.8553, 1.4626],
      [-1.3508, 1.66533],
      [0.4276, 1.85845],
      [1.1319, 1.79805],
      [3.2884, 2.48507],
      [3.4677, 2.54145],
      [6.9906, 0.5374],
      [10.22, 0.34781],
      [19.78, 0.34781],
      [23.0094, 0.5374],
      [26.5323, 2.54145],
      [26.7116, 2.48507],
      [28.8681, 1.79805],
      [29.5724, 1.85845],
      [31.3508, 1.66533],
      [31.8553, 1.4626],
      [34.2116, 1.51493],
      [34.2398, 1.50176],
      [37.714, 0.20195],
      [41.1433, 0.08517],
      [57.4556, 0.00004],
    ],
  },
];

describe('published strongly coupled systems', () => {
  it.each(ROWS)('$name has its published lines', ({ found, published }) => {
    const list = found();
    expect(list.length).toBe(published.length);
    list.forEach(([frequency, amplitude], l) => {
      // Published to 1e-4 Hz and 1e-5: half a unit of the last place, and 1e-4 where the table says no better.
      expect(Math.abs(frequency - published[l][0])).toBeLessThan(1.01e-4);
      expect(Math.abs(amplitude - published[l][1])).toBeLessThan(1e-4);
    });
  });

  it("AA'XX' has the A part of the closed form", () => {
    const part = lines(
      [
        [1, 0],
        [1, 0],
        [1, 1e7],
        [1, 1e7],
      ],
      [
        [0, 1, 8],
        [2, 3, 2],
        [0, 2, 9],
        [1, 3, 9],
        [0, 3, 1.5],
        [1, 2, 1.5],
      ],
    ).filter(([f]) => f < 1e6);
    // REFERENCE section 1; McConnell, McLean & Reilly, J. Chem. Phys. 23 (1955) 1152.
    const published: Line[] = [
      [-11.25, 0.2],
      [-7.8023, 0.3753],
      [-5.25, 4],
      [-1.8023, 1.6247],
      [-1.25, 1.8],
      [1.25, 1.8],
      [1.8023, 1.6247],
      [5.25, 4],
      [7.8023, 0.3753],
      [11.25, 0.2],
    ];
    expect(part.length).toBe(published.length);
    part.forEach(([frequency, amplitude], l) => {
      expect(Math.abs(frequency - published[l][0])).toBeLessThan(1.01e-4);
      expect(Math.abs(amplitude - published[l][1])).toBeLessThan(1e-4);
    });
  });
});

describe('reductions', () => {
  const close = (a: Line[], b: Line[]): void => {
    expect(a.length).toBe(b.length);
    a.forEach(([f, w], l) => {
      expect(Math.abs(f - b[l][0])).toBeLessThan(1e-7);
      expect(Math.abs(w - b[l][1])).toBeLessThan(1e-7);
    });
  };

  it('has one line when all shifts are equal, whatever the couplings', () => {
    close(
      lines(
        [
          [1, 50],
          [2, 50],
          [1, 50],
        ],
        [
          [0, 1, 7],
          [0, 2, -12],
          [1, 2, 3],
        ],
      ),
      [[50, 32]],
    );
  });

  it('does not see the sign of J in AB, AB2, A2B2 and A3B', () => {
    for (const [a, b] of [
      [1, 1],
      [1, 2],
      [2, 2],
      [3, 1],
    ]) {
      close(
        lines(
          [
            [a, 110],
            [b, 100],
          ],
          [[0, 1, 8]],
        ),
        lines(
          [
            [a, 110],
            [b, 100],
          ],
          [[0, 1, -8]],
        ),
      );
    }
  });

  it('does not see couplings inside a magnetically equivalent set', () => {
    const split = lines(
      [
        [1, 120],
        [1, 120],
        [2, 100],
      ],
      [
        [0, 1, 17],
        [0, 2, 7],
        [1, 2, 7],
      ],
    );
    close(
      split,
      lines(
        [
          [2, 120],
          [2, 100],
        ],
        [[0, 1, 7]],
      ),
    );
  });

  it('mirrors the list when all shifts are mirrored', () => {
    const plain = lines(
      [
        [1, 40],
        [1, 10],
        [1, 0],
      ],
      [
        [0, 1, 7],
        [1, 2, 11],
        [0, 2, 2],
      ],
    );
    const mirrored = lines(
      [
        [1, -40],
        [1, -10],
        [1, 0],
      ],
      [
        [0, 1, 7],
        [1, 2, 11],
        [0, 2, 2],
      ],
    );
    close(plain, mirrored.map(([f, w]): Line => [-f, w]).reverse());
  });
});

describe('sum rules', () => {
  // REFERENCE section 2 (trace method, Van Vleck 1948), the four-spin row with its printed moments.
  const shifts = [120, 97, 60.5, 33];
  const list = lines(
    shifts.map((shift) => [1, shift] as const),
    [
      [0, 1, 7],
      [0, 2, -12.5],
      [0, 3, 1.1],
      [1, 2, 4.4],
      [1, 3, 9.9],
      [2, 3, 15.2],
    ],
  );
  const total = list.reduce((sum, [, w]) => sum + w, 0);
  const mean = list.reduce((sum, [f, w]) => sum + f * w, 0) / total;
  const moment = (power: number): number =>
    list.reduce((sum, [f, w]) => {
      let term = w;
      for (let i = 0; i < power; i += 1) term *= f - mean;
      return sum + term;
    }, 0) / total;

  it('holds the printed total and moments to the share that dropped lines carry', () => {
    expect(total).toBeCloseTo(32, 4);
    expect(mean).toBeCloseTo(77.625, 4);
    expect(moment(2)).toBeCloseTo(1113.921875, 2);
    expect(moment(3) / -2631.12891).toBeCloseTo(1, 4);
    expect(moment(4) / 2002997.29).toBeCloseTo(1, 5);
  });
});
