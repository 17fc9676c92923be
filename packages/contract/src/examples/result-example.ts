import type { Estimate } from '../estimate.ts';
import type { ResultBody } from '../result-body.ts';

const sha256 = '9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08';

const shift: Estimate = {
  value: 1.9121,
  sd: 0.0001,
  low95: 1.9119,
  high95: 1.9123,
  unit: 'ppm',
  prior: { mean: 1.904, sd: 0.02 },
  informedFraction: 0.999975,
};
const linewidth: Estimate = { value: 1.1, sd: 0.02, low95: 1.06, high95: 1.14, unit: 'Hz' };
const amount: Estimate = { value: 2.41, sd: 0.012, low95: 2.386, high95: 2.434, unit: 'mmol/L' };

/** What a result looks like. The figures are invented and stand for no measurement. */
export const resultBodyExample: ResultBody = {
  schema: 'spinassay-result/1',
  inputs: {
    signalSha256: sha256,
    conditionsSha256: sha256,
    methodSha256: sha256,
    compoundSha256s: { acetate: sha256, 'trimethylsilylpropanoate-d4': sha256 },
    preparationSha256: sha256,
    optionsSha256: sha256,
  },
  engineVersion: '0.1.0',
  numericsId: 'example',
  seed: '81985529216486895',
  explainsSpectrum: { verdict: 'supported', detail: 'the residual of every window is within its limit' },
  recommendation: {
    overall: 'held',
    byClaim: [
      { claim: 'shifts', recommendation: 'releasable', reasons: [] },
      { claim: 'amounts', recommendation: 'held', reasons: ['flip-angle-undeclared'] },
    ],
    reasons: [{ code: 'flip-angle-undeclared', detail: 'Declare flipAngleDegrees: amounts depend on it.' }],
  },
  reference: {
    compoundId: 'trimethylsilylpropanoate-d4',
    scale: 'TSP',
    found: true,
    shiftOffsetPpm: 0.0021,
    linewidthHz: 0.9,
    amplitude: 4.5,
    amplitudeWithoutSatellites: 4.3,
    signalToNoise: 2100,
  },
  signal: {
    sampleCount: 16384,
    firstSampleIndex: 16,
    dwellSeconds: 0.0001666,
    observeFrequencyMHz: 500.13,
    noiseSdPerComponent: 812.4,
    phaseRadians: 0.31,
    timeZeroSamples: 0.02,
  },
  discrepancy: { mean: 0.012, sd: 0.003 },
  compounds: [
    {
      compoundId: 'acetate',
      compoundVersion: 1,
      name: 'acetate',
      presence: {
        verdict: 'supported',
        logBayesFactor: 5210,
        amplitudePrior: 'half-normal, scale 10 times the reference',
      },
      amount: {
        species: 'acetate',
        quantityKind: 'amount-concentration',
        basis: 'tube',
        unit: 'mmol/L',
        rawEstimate: 2.41,
        comparator: '=',
        posterior: amount,
        combinedStandardUncertainty: 0.023,
        coverageFactor: 2,
        expandedUncertainty: 0.046,
        budget: [
          { source: 'fit', standardUncertaintyRelative: 0.005 },
          { source: 'standard', standardUncertaintyRelative: 0.008 },
        ],
        reported: '(2.410 ± 0.046) mmol/L, k = 2',
      },
      spinSystems: [
        {
          label: 'methyl',
          groups: [{ label: 'CH3', protonCount: 3, shift, linewidth }],
          couplings: [],
          exchangeable: [],
        },
      ],
    },
  ],
  windows: [
    { lowPpm: 1.8, highPpm: 2, binCount: 220, baselineTermCount: 3, residualFraction: 0.018, reducedChiSquare: 1.2 },
  ],
  unexplained: [],
  artefacts: [],
  radiationDamping: { noticed: false, detail: 'no line is strong enough', facts: {} },
  diagnostics: { startCount: 8, evaluationCount: 2400, modeCount: 1, converged: true },
  sources: ['Govindaraju, Young & Maudsley, NMR Biomed. 13 (2000) 129'],
  cautions: ['An interval covers only the model and inputs it names.'],
};
