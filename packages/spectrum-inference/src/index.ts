export { answerQuestion } from './answer-question.ts';
export type { IntensityBroadening } from './intensity-broadening.ts';
export { SearchCancelled, type SearchHooks } from './population-search.ts';
export type { Estimate } from './posterior-estimate.ts';
export { responsePrior } from './response-prior.ts';
export type {
  CompoundAnswer,
  CouplingAnswer,
  GroupAnswer,
  ReferenceAnswer,
  SearchAnswer,
  SpectrumAnswer,
  SpinSystemAnswer,
  UnexplainedAnswer,
  WindowAnswer,
} from './spectrum-answer.ts';
export type {
  CompoundQuestion,
  CouplingQuestion,
  GroupQuestion,
  NormalPrior,
  PpmRange,
  SatelliteQuestion,
  SpectrumQuestion,
  SpinSystemQuestion,
  WindowQuestion,
} from './spectrum-question.ts';
