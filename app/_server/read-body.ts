import 'server-only';
import { z } from 'zod';
import { faultMessage } from '@/lib/domain/api/fault-message';
import { findJsonExcess, jsonBounds, type JsonExcess } from '@/lib/domain/api/json-bounds';
import { isStorable } from '@/lib/domain/api/storable-text';
import { AppError, type FieldProblem } from '@/lib/errors';
import { paceOfJson, timelyBody } from './timely-body';

// A script reads the same sentences as a person at a form.
z.config({ customError: faultMessage });

const jsonLimit = 1024 * 1024;

function refuseExcess({ what, byte }: JsonExcess): AppError {
  const at = `at byte ${byte}`;
  switch (what) {
    case 'depth': return new AppError('bad-request', `The body is nested deeper than ${jsonBounds.depth} levels ${at}. No call takes more than a few: send it flatter.`);
    case 'members': return new AppError('too-large', `The body holds more than ${jsonBounds.members} members and values, which is passed ${at}. Send it in several calls, or tables as files.`);
    case 'text': return new AppError('too-large', `The text that begins ${at} is longer than ${jsonBounds.text} characters. Shorten it.`);
  }
}

async function readText(request: Request, seconds: number): Promise<string> {
  if (!request.body) return '';
  const chunks: Uint8Array[] = [];
  let bytes = 0;
  for await (const chunk of timelyBody(request.body as unknown as AsyncIterable<Uint8Array>, paceOfJson(seconds))) {
    bytes += chunk.length;
    if (bytes > jsonLimit) throw new AppError('too-large', 'The body is over 1 MiB. Send files to the data or upload call of a grid.');
    chunks.push(chunk);
  }
  const whole = Buffer.concat(chunks);
  const excess = findJsonExcess(whole);
  if (excess) throw refuseExcess(excess);
  return whole.toString('utf8');
}

/** What zod found, each with the path of the member it is about. */
export function invalid(error: z.ZodError): AppError {
  const fields: FieldProblem[] = error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));
  const first = fields[0];
  return new AppError('invalid', first ? `${first.path === '' ? 'The body' : first.path}: ${first.message}` : 'The request is not valid.', { fields });
}

function storable(key: string, value: unknown): unknown {
  if (isStorable(key) && (typeof value !== 'string' || isStorable(value))) return value;
  const message = 'Found a character that no text can keep: a NUL, or half of a surrogate pair.';
  throw new AppError('invalid', `${isStorable(key) ? key : 'A name in the body'}: ${message}`, { fields: [{ path: isStorable(key) ? key : '', message }] });
}

/** The body as JSON, within bounds of size, shape and time: `seconds` without a byte end it. */
export async function readJson(request: Request, seconds: number): Promise<{ text: string; value: unknown }> {
  const text = await readText(request, seconds);
  if (text === '') return { text, value: undefined };
  try {
    return { text, value: JSON.parse(text, storable) as unknown };
  } catch (cause) {
    if (cause instanceof AppError) throw cause;
    throw new AppError('bad-request', `The body is not JSON: ${cause instanceof Error ? cause.message : 'unreadable'}.`, { cause });
  }
}
