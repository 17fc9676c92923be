import { operations } from '@spinassay/contract';

/** The small JCAMP-DX file that the contract shows as an example. */
export const jcampDxExample: string = operations.createAcquisition.request.content['chemical/x-jcamp-dx'].example;
