import { acquisitionPostSchema, acquisitionSchema } from '../acquisition.ts';
import { acquisitionExample, acquisitionPostExample, jcampDxExample } from '../examples/acquisition-examples.ts';
import { roles } from '../roles.ts';
import type { Operation } from './operation.ts';

/** Room for 4,194,304 float64 samples in base64 and some text would be 90 MB; a FID of a day's work is under 4 MB. */
const ACQUISITION_LIMIT_BYTES = 32 * 1024 * 1024;

/** Taking in measured signals and reading them back. */
export const acquisitionOperations = {
  createAcquisition: {
    operationId: 'createAcquisition',
    method: 'post',
    path: '/v1/acquisitions',
    tag: 'acquisitions',
    summary: 'Store a measured signal with its conditions. Sending the same again answers 200 with what is stored.',
    roles: ['pipeline', 'analyst'],
    request: {
      limitBytes: ACQUISITION_LIMIT_BYTES,
      content: {
        'application/json': { schema: acquisitionPostSchema, example: acquisitionPostExample },
        'chemical/x-jcamp-dx': {
          description: 'A JCAMP-DX file as it is, stored with undeclared sequence.',
          example: jcampDxExample,
        },
      },
    },
    answers: [
      {
        status: 201,
        description: 'Stored.',
        mediaType: 'application/json',
        schema: acquisitionSchema,
        example: acquisitionExample,
        headers: { Location: 'Path of the acquisition.' },
      },
      {
        status: 200,
        description: 'The same signal with the same conditions was already stored.',
        mediaType: 'application/json',
        schema: acquisitionSchema,
        example: acquisitionExample,
        headers: { Location: 'Path of the acquisition.' },
      },
    ],
    problems: ['conditions-differ', 'unreadable-acquisition'],
  },
  readAcquisition: {
    operationId: 'readAcquisition',
    method: 'get',
    path: '/v1/acquisitions/{id}',
    tag: 'acquisitions',
    summary: 'Read what is stored of an acquisition, without its samples.',
    roles,
    answers: [
      {
        status: 200,
        description: 'The acquisition.',
        mediaType: 'application/json',
        schema: acquisitionSchema,
        example: acquisitionExample,
      },
    ],
    problems: ['unknown-resource'],
  },
  readOriginal: {
    operationId: 'readOriginal',
    method: 'get',
    path: '/v1/acquisitions/{id}/original',
    tag: 'acquisitions',
    summary: 'Read the bytes as they came, with the content type they came with.',
    roles,
    answers: [{ status: 200, description: 'The bytes as they came.', mediaType: '*/*' }],
    problems: ['unknown-resource'],
  },
} as const satisfies Record<string, Operation>;
