import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { describeWithReferenceData } from '../../../tests/reference-data.ts';
import { findStarterCompound } from './find-starter-compound.ts';
import { starterCatalogue } from './starter-catalogue.ts';

// Each entry with its row of spin_parameters.csv: Dashti et al., Anal. Chem. 89 (2017) 12201 and 90 (2018) 10646.
const rowOf: Readonly<Record<string, string>> = {
  '4-aminobutyric-acid': 'bmse000871/1',
  'formic-acid': 'bmse000203/1',
  'butyric-acid': 'bmse000402/1',
  'l-glutamic-acid': 'bmse000913/1',
  'lactic-acid': 'bmse000979/1',
  'acetic-acid': 'bmse000191/1',
  'malic-acid': 'bmse000904/1',
  'succinic-acid': 'bmse000118/1',
  glycerol: 'bmse000856/1',
  ethanol: 'bmse000297/1',
  methanol: 'bmse000294/1',
  alanine: 'bmse000028/1',
  'citric-acid': 'bmse000076/1',
  'alpha-d-glucose': 'bmse000015_alpha',
  'beta-d-glucose': 'bmse000015_beta',
};

/** Entries whose values have other sources, which they state. */
const elsewhere = [
  'trimethylsilylpropanoate-d4',
  'trimethylsilylpropanesulfonate-d6',
  'tetramethylsilane',
  'ethyl-crotonate',
];

/** Couplings that an entry leaves out or replaces, as its comment says. */
const notTaken: Readonly<Record<string, readonly string[]>> = {
  '4-aminobutyric-acid': ['8-9', '10-11', '12-13'],
  'l-glutamic-acid': ['13-15', '14-15'],
};

type Row = { readonly shifts: ReadonlyMap<string, number>; readonly couplings: ReadonlyMap<string, number> };

function parseRow(line: string): Row {
  const [, , , shifts = '', couplings = ''] = line.split(',');
  const pairsOf = (field: string): Map<string, number> =>
    new Map(
      field
        .split(' ')
        .filter((item) => item !== '')
        .map((item) => {
          const [name = '', value] = item.split(':');
          return [name, Number(value)];
        }),
    );
  return { shifts: pairsOf(shifts), couplings: pairsOf(couplings) };
}

const atomOf = (spinLabel: string): string => spinLabel.replace(/^H/, '');

describeWithReferenceData('against the table of published parameters', (folder) => {
  const lines = readFileSync(join(folder, 'spin_parameters.csv'), 'utf8').split(/\r?\n/);
  const rowFor = (id: string): Row => {
    const line = lines.find((candidate) => candidate.split(',')[1] === rowOf[id]);
    if (line === undefined) throw new Error(`the table has no row ${rowOf[id]}`);
    return parseRow(line);
  };

  test('every entry is compared, or named as having other sources', () => {
    expect([...Object.keys(rowOf), ...elsewhere].sort()).toEqual(
      starterCatalogue()
        .map(({ id }) => id)
        .sort(),
    );
  });

  test.each(Object.keys(rowOf))('%s has the shifts of its row', (id) => {
    const { shifts } = rowFor(id);
    const groups = findStarterCompound(id)?.body.spinSystems.flatMap((system) => system.groups) ?? [];
    expect(groups.length).toBeGreaterThan(0);
    for (const group of groups) {
      for (const spin of group.spins) expect(group.shiftPpm, spin.label).toBe(shifts.get(atomOf(spin.label)));
    }
  });

  test.each(Object.keys(rowOf))('%s has the couplings of its row, averaged over what symmetry makes equal', (id) => {
    const { couplings: published } = rowFor(id);
    const couplings = findStarterCompound(id)?.body.spinSystems.flatMap((system) => system.couplings) ?? [];
    for (const coupling of couplings) {
      const names = coupling.pairs.map(([a, b]) => [`${atomOf(a)}-${atomOf(b)}`, `${atomOf(b)}-${atomOf(a)}`]);
      if (names.flat().some((name) => notTaken[id]?.includes(name))) continue;
      const values = names.map(([one = '', other = '']) => published.get(one) ?? published.get(other) ?? Number.NaN);
      const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
      expect(coupling.couplingHz, coupling.label).toBeCloseTo(mean, 9);
    }
  });

  test.each(Object.keys(rowOf))('%s leaves out no coupling between protons of different shift, but the named', (id) => {
    const { shifts, couplings: published } = rowFor(id);
    const system = findStarterCompound(id)?.body.spinSystems ?? [];
    const shiftOf = (atom: string): number | undefined => shifts.get(atom);
    const held = new Set(
      system.flatMap(({ groups, couplings }) => {
        const shift = new Map(
          groups.flatMap((group) => group.spins.map((spin) => [spin.label, group.shiftPpm] as const)),
        );
        return couplings.flatMap(({ pairs }) => pairs.map(([a, b]) => [shift.get(a), shift.get(b)].sort().join(' ')));
      }),
    );
    for (const name of published.keys()) {
      const [a = '', b = ''] = name.split('-');
      if (shiftOf(a) === shiftOf(b) || notTaken[id]?.includes(name)) continue;
      expect(held, name).toContain([shiftOf(a), shiftOf(b)].sort().join(' '));
    }
  });
});
