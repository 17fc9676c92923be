import { type CompoundBody, compoundBodySchema } from '@spinassay/contract';
import { describe, expect, test } from 'vitest';
import { findStarterCompound } from './find-starter-compound.ts';
import { starterCatalogue } from './starter-catalogue.ts';

const catalogue = starterCatalogue();
const cases = catalogue.map(({ id, body }) => [id, body] as const);

// Conventional atomic weights, IUPAC 2021 (Prohaska et al., Pure Appl. Chem. 94 (2022) 573), rounded; D is the nuclide.
const atomicWeights: Readonly<Record<string, number>> = {
  H: 1.008,
  D: 2.0141,
  C: 12.011,
  N: 14.007,
  O: 15.999,
  Na: 22.98977,
  Si: 28.085,
  S: 32.06,
};

// Protons on O and N, which exchange with water and are in no spin system: counted by hand from the structures.
const exchangeableProtonCount: Readonly<Record<string, number>> = {
  'trimethylsilylpropanoate-d4': 0,
  'trimethylsilylpropanesulfonate-d6': 0,
  tetramethylsilane: 0,
  '4-aminobutyric-acid': 3,
  'formic-acid': 1,
  'butyric-acid': 1,
  'l-glutamic-acid': 4,
  'ethyl-crotonate': 0,
  'lactic-acid': 2,
  'acetic-acid': 1,
  'malic-acid': 3,
  'succinic-acid': 2,
  glycerol: 3,
  ethanol: 1,
  methanol: 1,
  alanine: 3,
  'citric-acid': 4,
  'alpha-d-glucose': 5,
  'beta-d-glucose': 5,
};

function atomCounts(formula: string): [element: string, count: number][] {
  return Array.from(formula.matchAll(/([A-Z][a-z]?)(\d*)/g), ([, element = '', count]) => [
    element,
    Number(count || 1),
  ]);
}

function protonCount({ spinSystems }: CompoundBody): number {
  const spins = spinSystems.flatMap(({ count, groups }) =>
    groups.flatMap((group) => group.spins.map((spin) => count * spin.protonCount)),
  );
  return spins.reduce((sum, protons) => sum + protons, 0);
}

test('holds the compounds counted by hand below, each id once', () => {
  expect(catalogue.map(({ id }) => id).sort()).toEqual(Object.keys(exchangeableProtonCount).sort());
});

test('hands out copies that may be changed', () => {
  const changed = findStarterCompound('glycerol');
  if (changed !== undefined) changed.body.name = 'changed';
  expect(findStarterCompound('glycerol')?.body.name).toBe('glycerol');
  expect(findStarterCompound('unobtainium')).toBeUndefined();
});

describe.each(cases)('%s', (id, body) => {
  test('passes the schema of the contract: unique labels, couplings between spins that exist', () => {
    expect(compoundBodySchema.safeParse(body)).toMatchObject({ success: true });
    expect(id).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
  });

  test('cites for every value a source that it lists', () => {
    const cited = body.spinSystems.flatMap((system) => [
      ...system.groups.map((group) => group.source),
      ...system.couplings.map((coupling) => coupling.source),
      ...(system.satellites ?? []).map((satellite) => satellite.source),
    ]);
    for (const source of cited) {
      expect(
        body.sources.some((listed) => source === listed || source.startsWith(`${listed}; `)),
        source,
      ).toBe(true);
    }
    expect(new Set(body.sources).size).toBe(body.sources.length);
  });

  test('has the protons of its formula, less those that exchange', () => {
    const hydrogens = atomCounts(body.formula ?? '').find(([element]) => element === 'H')?.[1];
    expect(protonCount(body) + (exchangeableProtonCount[id] ?? Number.NaN)).toBe(hydrogens);
  });

  test('has the molar mass of its formula', () => {
    const mass = atomCounts(body.formula ?? '').reduce(
      (sum, [el, count]) => sum + (atomicWeights[el] ?? Number.NaN) * count,
      0,
    );
    expect(Math.abs(mass - body.molarMassGramsPerMole)).toBeLessThan(0.0006);
  });

  test('has a CAS number whose check digit is right', () => {
    // CAS: the last digit is the sum of the others, each times its place from the right, modulo 10.
    const digits = (body.casNumber ?? '').replaceAll('-', '').split('').map(Number).reverse();
    const [check, ...others] = digits;
    expect(others.reduce((sum, digit, index) => sum + digit * (index + 1), 0) % 10).toBe(check);
  });

  test('has systems of at most ten protons, whose spins all hang together', () => {
    for (const system of body.spinSystems) {
      const spins = system.groups.flatMap((group) => group.spins);
      expect(spins.reduce((sum, spin) => sum + spin.protonCount, 0)).toBeLessThanOrEqual(10);
      const reached = new Set(spins.slice(0, 1).map((spin) => spin.label));
      const pairs = system.couplings.flatMap((coupling) => coupling.pairs);
      for (let round = 0; round < spins.length; round += 1) {
        for (const pair of pairs)
          if (pair.some((label) => reached.has(label))) for (const label of pair) reached.add(label);
      }
      expect(reached.size).toBe(spins.length);
    }
  });
});

// The published molar masses of handbooks (CRC Handbook of Chemistry and Physics, from memory), g/mol.
test.each([
  ['4-aminobutyric-acid', 103.12],
  ['citric-acid', 192.12],
  ['alpha-d-glucose', 180.16],
  ['ethanol', 46.07],
  ['tetramethylsilane', 88.22],
  ['ethyl-crotonate', 114.14],
])('%s weighs %d g/mol as in handbooks', (id, grams) => {
  expect(findStarterCompound(id)?.body.molarMassGramsPerMole).toBeCloseTo(grams, 2);
});
