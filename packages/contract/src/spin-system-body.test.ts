import { expect, test } from 'vitest';
import { compoundPostExample } from './examples/document-examples.ts';
import { compoundPostSchema } from './versioned-documents.ts';

// The promises under test are the words of the wire, ours; no outside source.
const source = 'invented for this test';

function propenyl(): { id: string; body: Record<string, unknown> } {
  const group = (label: string, shiftPpm: number, spins: { label: string; protonCount: number }[]): unknown => ({
    label,
    shiftPpm,
    shiftScale: 'TMS',
    spins,
    source,
  });
  return {
    id: 'propenyl',
    body: {
      ...compoundPostExample.body,
      spinSystems: [
        {
          label: 'CH3-CH=CH',
          count: 1,
          groups: [
            group('CH3', 1.87, [{ label: 'M', protonCount: 3 }]),
            group('CH', 6.97, [{ label: 'B', protonCount: 1 }]),
          ],
          couplings: [{ label: 'J', pairs: [['M', 'B']], couplingHz: 6.9, kind: 'vicinal', source }],
        },
      ],
    },
  };
}

function faultsOf(change: (system: Record<string, unknown>) => void): string[] {
  const post = propenyl();
  const [system] = post.body['spinSystems'] as Record<string, unknown>[];
  change(system ?? {});
  const parsed = compoundPostSchema.safeParse(post);
  return parsed.success ? [] : parsed.error.issues.map((issue) => issue.path.join('/'));
}

test('takes a composite CH3 coupled to one proton', () => {
  expect(compoundPostSchema.safeParse(propenyl()).success).toBe(true);
});

test('points at a coupling that names a spin which is not there', () => {
  const coupling = { label: 'J', pairs: [['M', 'X']], couplingHz: 6.9, kind: 'vicinal', source };
  expect(faultsOf((system) => Object.assign(system, { couplings: [coupling] }))).toEqual([
    'body/spinSystems/0/couplings/0/pairs/0/1',
  ]);
});

test('refuses a pair that is coupled twice in either order, and a spin coupled to itself', () => {
  const couplings = [
    { label: 'J', pairs: [['M', 'B']], couplingHz: 6.9, kind: 'vicinal', source },
    { label: 'K', pairs: [['B', 'M']], couplingHz: 1, kind: 'other', source },
    { label: 'L', pairs: [['B', 'B']], couplingHz: 1, kind: 'other', source },
  ];
  expect(faultsOf((system) => Object.assign(system, { couplings }))).toEqual([
    'body/spinSystems/0/couplings/1/pairs/0',
    'body/spinSystems/0/couplings/2/pairs/0',
  ]);
});

test('points at satellites of a group which is not there', () => {
  const satellites = [{ nucleus: '29Si', groupLabel: 'Si', couplingHz: 6.6, abundanceFraction: 0.0467, source }];
  expect(faultsOf((system) => Object.assign(system, { satellites }))).toEqual([
    'body/spinSystems/0/satellites/0/groupLabel',
  ]);
});

test('lists every fault at once: shape, unknown members and references left dangling', () => {
  const faults = faultsOf((system) => Object.assign(system, { count: 0, groups: [], note: 'x' }));
  expect(faults.sort()).toEqual([
    'body/spinSystems/0',
    'body/spinSystems/0/count',
    'body/spinSystems/0/couplings/0/pairs/0/0',
    'body/spinSystems/0/couplings/0/pairs/0/1',
    'body/spinSystems/0/groups',
  ]);
});
