import type { Acquisition, CompoundPost, Fit, FitPost, MethodPost, PreparationPost } from '@spinassay/contract';
import type { ApiFixture } from './api-fixture.ts';

const source = 'invented for this test';

/** A compound of one singlet of three protons. */
export function singletCompound(id: string, shiftPpm: number): CompoundPost {
  const groups = [
    { label: 'CH3', shiftPpm, shiftScale: 'TSP' as const, spins: [{ label: 'H', protonCount: 3 }], source },
  ];
  return {
    id,
    body: {
      name: id,
      molarMassGramsPerMole: 60,
      spinSystems: [{ label: 'methyl', count: 1, groups, couplings: [] }],
      sources: [source],
    },
  };
}

/** A method that expects acetate and takes 0 ppm and amounts from TSP. */
export const acetateMethod: MethodPost = {
  id: 'acetate-in-cider',
  body: {
    name: 'Acetate in cider',
    panel: [{ compoundId: 'acetate', quantifierGroups: ['CH3'] }],
    reference: { compoundId: 'tsp' },
    standard: { compoundId: 'tsp' },
    claims: ['shifts', 'amounts'],
  },
};

/** A tube with TSP. */
export const tspPreparation: PreparationPost = {
  id: 'tank-4',
  body: {
    standard: {
      compoundId: 'tsp',
      amountConcentration: { value: 0.5, standardUncertainty: 0.004, unit: 'mmol/L' },
    },
  },
};

/** A damped line as float32 numbers; another `frequencyHz` makes another signal. */
export function signalOf(frequencyHz: number, sampleCount = 32): object {
  const dwellSeconds = 0.0005;
  const numbers = Float32Array.from({ length: 2 * sampleCount }, (_, position) => {
    const time = Math.floor(position / 2) * dwellSeconds;
    const phase = 2 * Math.PI * frequencyHz * time;
    return 1000 * Math.exp(-time / 0.02) * (position % 2 === 0 ? Math.cos(phase) : Math.sin(phase));
  });
  const data = Buffer.from(numbers.buffer).toString('base64');
  return { encoding: 'float32', data, sampleCount, dwellSeconds, observeFrequencyMHz: 500.13 };
}

/** Send something that has to be stored, and give back what was answered. */
export async function put<T>(api: ApiFixture, path: string, json: unknown): Promise<T> {
  const role = path === '/v1/compounds' || path === '/v1/methods' ? 'method-owner' : 'pipeline';
  const response = await api.send('POST', path, { role, json });
  if (!response.ok) throw new Error(`POST ${path} answered ${response.status}: ${await response.text()}`);
  return (await response.json()) as T;
}

/** Store two compounds, a method, a preparation and an acquisition, and give back what a fit has to say. */
export async function stockLaboratory(api: ApiFixture): Promise<FitPost> {
  await put(api, '/v1/compounds', singletCompound('acetate', 1.91));
  await put(api, '/v1/compounds', singletCompound('tsp', 0));
  await put(api, '/v1/methods', acetateMethod);
  await put(api, '/v1/preparations', tspPreparation);
  const acquisition = await put<Acquisition>(api, '/v1/acquisitions', { signal: signalOf(200) });
  return { acquisitionId: acquisition.id, methodId: acetateMethod.id, preparationId: tspPreparation.id };
}

/** Ask for the fit of a stocked laboratory. */
export async function askForFit(api: ApiFixture): Promise<Fit> {
  return put<Fit>(api, '/v1/fits', await stockLaboratory(api));
}
