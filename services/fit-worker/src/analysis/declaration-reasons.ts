import type { SpectrumAnswer } from '@spinassay/spectrum-inference';
import { responsePrior } from '@spinassay/spectrum-inference';
import type { AnalysisRequest } from './analysis-request.ts';
import { ALL_CLAIMS, type Holding } from './judge.ts';

/** Recovery must be known this well before an amount is stated, relative. */
const RESPONSE_SD_MAX = 0.02;

/** Reasons that lie in what was declared of the tube and of the acquisition. */
export function declarationReasons(request: AnalysisRequest, answer: SpectrumAnswer): Holding[] {
  return [...referenceReasons(answer), ...sequenceReasons(request), ...amountReasons(request)];
}

function referenceReasons({ reference }: SpectrumAnswer): Holding[] {
  if (reference.isFound) return [];
  const why =
    reference.trouble === 'not-a-singlet'
      ? 'the largest signal near 0 ppm has a partner of comparable height'
      : `nothing near 0 ppm stands 50 times above the noise (${reference.signalToNoise.toFixed(1)} times)`;
  return [
    {
      holds: ['shifts', 'amounts'],
      reason: {
        code: 'reference-not-found',
        detail: `No reference line was found: ${why}. Shifts rest on the declared axis alone.`,
      },
    },
  ];
}

function sequenceReasons({ conditions }: AnalysisRequest): Holding[] {
  if (conditions.sequence === undefined) {
    return [
      {
        holds: ALL_CLAIMS,
        reason: {
          code: 'sequence-undeclared',
          detail:
            'The pulse sequence is not declared, and with it what the amplitudes mean. Declare conditions.sequence.',
        },
      },
    ];
  }
  if (conditions.sequence === 'single-pulse') return [];
  return [
    {
      holds: ['ratios', 'amounts'],
      reason: {
        code: 'sequence-changes-amplitudes',
        detail: `Amplitudes after "${conditions.sequence}" need measured response factors, which the method does not have.`,
      },
    },
  ];
}

function amountReasons(request: AnalysisRequest): Holding[] {
  const { method, preparation, conditions } = request;
  if (!method.claims.includes('amounts')) return [];
  const hold = (code: string, detail: string): Holding => ({ holds: ['amounts'], reason: { code, detail } });
  const holdings: Holding[] = [];
  if (preparation === undefined) {
    holdings.push(hold('no-preparation', 'Amounts need the preparation: which standard is in the tube, and how much.'));
  } else if (preparation.standard.compoundId !== method.standard?.compoundId) {
    holdings.push(
      hold(
        'standard-differs',
        `The method counts against ${method.standard?.compoundId ?? 'no standard'}, the preparation holds ${preparation.standard.compoundId}.`,
      ),
    );
  }
  const response = responsePrior({
    flipAngleDegrees: conditions.flipAngleDegrees,
    repetitionSeconds:
      conditions.recycleDelaySeconds === undefined
        ? undefined
        : conditions.recycleDelaySeconds + (request.samples.length / 2) * request.dwellSeconds,
  });
  if (response.sd > RESPONSE_SD_MAX) {
    holdings.push(
      hold(
        'recovery-unknown',
        'Flip angle and repetition time, as declared, leave the recovery of slow protons open by more than 2 %. Wait longer between scans or declare both.',
      ),
    );
  }
  return holdings;
}
