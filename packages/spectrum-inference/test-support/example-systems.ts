import type { CompoundQuestion, NormalPrior, SpinSystemQuestion } from '../src/spectrum-question.ts';

const FULL_RESPONSE: NormalPrior = { mean: 1, sd: 5e-4 };

/** A reference singlet of nine protons at 0 ppm. */
export function nineProtonReference(satellites: SpinSystemQuestion['satellites'] = []): CompoundQuestion {
  return {
    id: 'reference',
    spinSystems: [
      {
        label: 'singlet',
        copyCount: 1,
        groups: [
          {
            label: 'CH3',
            shiftPpm: { mean: 0, sd: 0 },
            responseFactor: FULL_RESPONSE,
            spins: [{ label: 'CH3', protonCount: 9 }],
          },
        ],
        couplings: [],
        satellites,
      },
    ],
  };
}

/** Spins of one proton each, all couplings free. */
export function chainSystem(
  shiftsPpm: readonly number[],
  couplingsHz: readonly (readonly [number, number, number])[],
  widths: { shiftSdPpm: number; couplingSdHz: number } = { shiftSdPpm: 0.03, couplingSdHz: 0.5 },
): SpinSystemQuestion {
  return {
    label: 'chain',
    copyCount: 1,
    groups: shiftsPpm.map((mean, i) => ({
      label: `H${i + 1}`,
      shiftPpm: { mean, sd: widths.shiftSdPpm },
      responseFactor: FULL_RESPONSE,
      spins: [{ label: `H${i + 1}`, protonCount: 1 }],
    })),
    couplings: couplingsHz.map(([a, b, mean]) => ({
      label: `J${a + 1}${b + 1}`,
      couplingHz: { mean, sd: widths.couplingSdHz },
      pairs: [[a, b]],
    })),
    satellites: [],
  };
}

/** Three CH2 groups in a row, J and J' between neighbours, geminals free: an AA'MM'XX' system. */
export function threeMethylenes(shiftsPpm: readonly [number, number, number] = [1.9, 2.3, 3.0]): SpinSystemQuestion {
  const labels = ['A', 'M', 'X'];
  return {
    label: 'chain of CH2',
    copyCount: 1,
    groups: [1, 0, 2].map((which) => ({
      label: labels[which],
      shiftPpm: { mean: shiftsPpm[which], sd: 0.03 },
      responseFactor: FULL_RESPONSE,
      spins: [
        { label: `${labels[which]}1`, protonCount: 1 },
        { label: `${labels[which]}2`, protonCount: 1 },
      ],
    })),
    couplings: [
      {
        label: 'J(M,A)',
        couplingHz: { mean: 7.5, sd: 0.5 },
        pairs: [
          [0, 2],
          [1, 3],
        ],
      },
      {
        label: "J'(M,A)",
        couplingHz: { mean: 7.6, sd: 0.5 },
        pairs: [
          [0, 3],
          [1, 2],
        ],
      },
      {
        label: 'J(M,X)',
        couplingHz: { mean: 6.0, sd: 0.5 },
        pairs: [
          [0, 4],
          [1, 5],
        ],
      },
      {
        label: "J'(M,X)",
        couplingHz: { mean: 9.2, sd: 0.5 },
        pairs: [
          [0, 5],
          [1, 4],
        ],
      },
      { label: 'gem M', couplingHz: { mean: -13, sd: 1.5 }, pairs: [[0, 1]] },
      { label: 'gem A', couplingHz: { mean: -13, sd: 1.5 }, pairs: [[2, 3]] },
      { label: 'gem X', couplingHz: { mean: -13, sd: 1.5 }, pairs: [[4, 5]] },
    ],
    satellites: [],
  };
}
