import { Ajv2020, type ValidateFunction } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';
import type { ContractShape } from '@/lib/domain/api/contract';
import { need } from './environment';

interface Media { schema?: object }
interface Responses { responses: Record<string, { content?: Record<string, Media> } | undefined> }
interface ApiDocument { paths: Record<string, Record<string, Responses | undefined> | undefined> }

async function readDocument(): Promise<ApiDocument> {
  const response = await fetch(`${need('WEB_URL')}/api/v1/openapi.json`);
  return (await response.json()) as ApiDocument;
}

function createCheck(document: ApiDocument) {
  const ajv = new Ajv2020({ strict: false, allErrors: true });
  addFormats(ajv);
  ajv.addSchema(document, 'document');
  const compiled = new Map<string, ValidateFunction>();
  const escape = (part: string) => encodeURIComponent(part.replaceAll('~', '~0').replaceAll('/', '~1'));

  return (contract: ContractShape, status: number, mediaType: string, body: unknown) => {
    const { path, method } = contract;
    const name = `${method} ${path} ${status}`;
    const stated = document.paths[path]?.[method.toLowerCase()]?.responses[String(status)];
    if (!stated) throw new Error(`${name} is not in the OpenAPI document: ${JSON.stringify(body)}`);
    if (!stated.content) return;
    if (!stated.content[mediaType]?.schema) throw new Error(`${name} came as ${mediaType}; the document has ${Object.keys(stated.content).join(', ')}.`);
    const pointer = ['paths', path, method.toLowerCase(), 'responses', String(status), 'content', mediaType, 'schema'].map(escape).join('/');
    let validate = compiled.get(pointer);
    if (!validate) {
      validate = ajv.compile({ $ref: `document#/${pointer}` });
      compiled.set(pointer, validate);
    }
    if (!validate(body)) throw new Error(`${name} is not as the OpenAPI document says: ${ajv.errorsText(validate.errors)}`);
  };
}

let check: ReturnType<typeof createCheck> | undefined;

/** Fails where a response has a status or a shape that the product's own document does not state. */
export async function checkAgainstDocument(contract: ContractShape, status: number, mediaType: string, body: unknown): Promise<void> {
  check ??= createCheck(await readDocument());
  check(contract, status, mediaType, body);
}
