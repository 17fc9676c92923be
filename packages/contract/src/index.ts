export {
  type Acquisition,
  type AcquisitionPost,
  acquisitionPostSchema,
  acquisitionSchema,
  type SignalBody,
  sampleCountLimits,
  signalBodySchema,
} from './acquisition.ts';
export { canonicalJson } from './canonical-json.ts';
export { type CheckedShape, checkShape, type ShapeFault, type WireSchema, type WireValue } from './check-shape.ts';
export { type CompoundBody, compoundBodySchema } from './compound-body.ts';
export {
  type Amount,
  amountSchema,
  type CompoundResult,
  type CouplingResult,
  compoundResultSchema,
  couplingResultSchema,
  type GroupResult,
  groupResultSchema,
  type Verdict,
  verdictSchema,
} from './compound-result.ts';
export { type Conditions, conditionsSchema, type Sequence, sequenceSchema } from './conditions.ts';
export { type Estimate, estimateSchema, type Quantity, quantitySchema } from './estimate.ts';
export { type FeedEvent, type FeedPage, feedEventSchema, feedLimits, feedPageSchema } from './feed.ts';
export {
  type Fit,
  type FitOptions,
  type FitPost,
  type FitStatus,
  fitOptionsSchema,
  fitPostSchema,
  fitSchema,
  fitStatusSchema,
} from './fit.ts';
export { type Health, healthSchema, type Readiness, readinessSchema } from './health.ts';
export { serviceIdSchema, sha256Schema, slugSchema, versionSchema } from './identifiers.ts';
export { type Claim, claimSchema, type MethodBody, methodBodySchema, methodDefaults } from './method-body.ts';
export { buildOpenApi } from './openapi/build-openapi.ts';
export { openApiText } from './openapi/openapi-text.ts';
export { type Operation, problemsOf } from './operations/operation.ts';
export { type OperationId, operations } from './operations/operations.ts';
export { type PreparationBody, preparationBodySchema } from './preparation-body.ts';
export { type Problem, problemSchema } from './problem.ts';
export { emptyQuerySchema, feedQuerySchema, versionQuerySchema } from './queries.ts';
export {
  type Reason,
  type ReasonCode,
  type Recommendation,
  type Release,
  reasonCodeSchema,
  reasonSchema,
  recommendationSchema,
  releaseSchema,
} from './recommendation.ts';
export { type ResultBody, resultBodySchema, resultSchemaName } from './result-body.ts';
export { isRole, type Role, roles } from './roles.ts';
export { sha256Hex } from './sha256-hex.ts';
export { type SignalScales, signalDigest } from './signal-digest.ts';
export {
  type CouplingBody,
  couplingBodySchema,
  type GroupBody,
  groupBodySchema,
  type SpinSystemBody,
  spinSystemBodySchema,
} from './spin-system-body.ts';
export {
  type Compound,
  type CompoundPost,
  compoundPostSchema,
  compoundSchema,
  type DocumentList,
  documentListSchema,
  type Method,
  type MethodPost,
  methodPostSchema,
  methodSchema,
  type Preparation,
  type PreparationPost,
  preparationPostSchema,
  preparationSchema,
} from './versioned-documents.ts';
