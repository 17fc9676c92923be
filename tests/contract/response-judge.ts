import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';
import { parse } from 'yaml';

type Media = { schema?: object };
type DescribedOperation = {
  operationId: string;
  requestBody?: { content: Record<string, Media & { example: unknown }> };
  responses: Record<string, { content?: Record<string, Media> }>;
  'x-problems': string[];
};

/** The committed `openapi.yaml`, read as any client would read it. */
export const openApi: { paths: Record<string, Record<string, DescribedOperation>> } = parse(
  readFileSync(fileURLToPath(new URL('../../openapi.yaml', import.meta.url)), 'utf8'),
);

/** Every operation with its place, in the order of the document. */
export const describedOperations = Object.entries(openApi.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method, ...operation })),
);

const documentId = 'https://spinassay.invalid/openapi';
const ajv = new Ajv2020({ strict: false, allErrors: true });
addFormats.default(ajv);
// An annotation in JSON Schema; the pattern beside it is what is checked.
ajv.addFormat('base64', true);
ajv.addSchema({ $id: documentId, ...openApi });
const compiled = new Map<string, ValidateFunction>();

/**
 * Hold a response to `openapi.yaml` with a general JSON Schema validator.
 *
 * @returns what is wrong with it; empty when the document declares it as it is
 */
export async function faultsOfResponse(operationId: string, response: Response): Promise<string[]> {
  const operation = describedOperations.find((candidate) => candidate.operationId === operationId);
  const declared = operation?.responses[String(response.status)];
  if (declared === undefined) return [`${operationId} does not declare ${response.status}`];
  if (declared.content === undefined) {
    const text = await response.text();
    return text === '' ? [] : [`${operationId} declares no body for ${response.status}`];
  }
  const mediaType = (response.headers.get('content-type') ?? '').split(';')[0] ?? '';
  const media = declared.content[mediaType] ?? declared.content['*/*'];
  if (media === undefined) return [`${operationId} ${response.status} does not declare ${mediaType}`];
  if (media.schema === undefined) return [];
  const validate = validatorOf(media.schema);
  const body: unknown = JSON.parse(await response.text());
  return validate(body) ? [] : (validate.errors ?? []).map((error) => `${error.instancePath} ${error.message}`);
}

function validatorOf(schema: object): ValidateFunction {
  const text = JSON.stringify(schema).replaceAll('"#/', `"${documentId}#/`);
  const known = compiled.get(text);
  if (known !== undefined) return known;
  const validate = ajv.compile(JSON.parse(text));
  compiled.set(text, validate);
  return validate;
}
