import { describe, expect, test } from 'vitest';
import { findStarterCompound } from './find-starter-compound.ts';
import { starterCatalogue } from './starter-catalogue.ts';

const catalogue = starterCatalogue();
const systems = catalogue.flatMap(({ id, body }) => body.spinSystems.map((system) => ({ id, body, ...system })));
const couplings = systems.flatMap(({ id, couplings }) => couplings.map((coupling) => ({ id, ...coupling })));

function groupOf(id: string, label: string) {
  const groups = findStarterCompound(id)?.body.spinSystems.flatMap((system) => system.groups) ?? [];
  return groups.find((group) => group.label === label);
}

describe('shift references', () => {
  const references = systems.filter(({ body }) => body.scaleZero !== undefined);

  test('are TSP, DSS and TMS, and stand at zero of their own scale', () => {
    expect(references.map(({ body }) => body.scaleZero).sort()).toEqual(['DSS', 'TMS', 'TSP']);
    for (const { body, groups } of references) {
      for (const group of groups) expect(group).toMatchObject({ shiftPpm: 0, shiftScale: body.scaleZero });
    }
  });

  // 29Si: 0.04685(8), isotopic compositions 2013, Meija et al., Pure Appl. Chem. 88 (2016) 293 (from memory); older
  // tables say 0.0467. |2J(Si,H)| of trimethylsilyl groups: 6.6 to 6.7 Hz (common knowledge, from memory).
  test('have silicon satellites of the natural abundance', () => {
    for (const { id, satellites = [] } of references) {
      expect(
        satellites.map(({ nucleus }) => nucleus),
        id,
      ).toEqual(['29Si']);
      for (const { abundanceFraction, couplingHz } of satellites) {
        expect(Math.abs(abundanceFraction - 0.04685)).toBeLessThan(0.0003);
        expect(Math.abs(Math.abs(couplingHz) - 6.65)).toBeLessThanOrEqual(0.1);
      }
    }
  });
});

// The data bank refers proton shifts in water to DSS: Markley et al., Pure Appl. Chem. 70 (1998) 117 (from memory).
test('shifts from the data bank are on its scale, DSS', () => {
  const cited = systems.flatMap(({ groups }) => groups).filter((group) => group.source.includes('BMRB'));
  expect(cited.length).toBeGreaterThan(0);
  for (const group of cited) expect(group.shiftScale, group.label).toBe('DSS');
});

// Ranges of proton couplings in textbooks, such as Hesse, Meier & Zeeh, Spectroscopic Methods (from memory):
// geminal at sp3 carbon -10 to -16 Hz, vicinal 0 to 18 Hz, over more bonds within 3 Hz of zero.
test.each([
  ['geminal', -16, -10],
  ['vicinal', 0, 18],
  ['long-range', -3, 3],
] as const)('%s couplings lie between %d and %d Hz', (kind, low, high) => {
  const ofKind = couplings.filter((coupling) => coupling.kind === kind);
  expect(ofKind.length).toBeGreaterThan(0);
  for (const { id, label, couplingHz } of ofKind) {
    expect(couplingHz, `${id} ${label}`).toBeGreaterThanOrEqual(low);
    expect(couplingHz, `${id} ${label}`).toBeLessThanOrEqual(high);
  }
});

describe('ethyl crotonate', () => {
  // Olefin increments, 5.25 + gem + cis + trans: Pascual, Meier & Simon, Helv. Chim. Acta 49 (1966) 164 (from memory),
  // alkyl 0.45, -0.22, -0.28; COOR 0.80, 1.18, 0.55. Its authors give about 0.15 ppm for simple olefins (from memory).
  test.each([
    ['C2H', 5.25 + 0.8 - 0.22],
    ['C3H', 5.25 + 0.45 + 1.18],
  ])('%s lies where the increments of olefins put it', (label, shiftPpm) => {
    expect(Math.abs((groupOf('ethyl-crotonate', label)?.shiftPpm ?? Number.NaN) - shiftPpm)).toBeLessThan(0.15);
  });

  // Ethyl acetate in CDCl3: Fulmer et al., Organometallics 29 (2010) 2176 (from memory). Another ester: 0.1 ppm.
  test.each([
    ['OCH2', 4.12],
    ['CH3', 1.26],
  ])('%s lies where ethyl acetate has it', (label, shiftPpm) => {
    expect(Math.abs((groupOf('ethyl-crotonate', label)?.shiftPpm ?? Number.NaN) - shiftPpm)).toBeLessThan(0.1);
  });

  test('is the trans isomer: 12 to 18 Hz across the double bond, where cis has 6 to 12 (same textbook)', () => {
    const across = couplings.find(({ id, label }) => id === 'ethyl-crotonate' && label === 'J(C2H,C3H)');
    expect(across?.couplingHz).toBeGreaterThan(12);
  });
});
