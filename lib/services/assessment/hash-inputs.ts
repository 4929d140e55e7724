import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

/** SHA-256, hexadecimal, over the RFC 8785 canonical JSON of what an assessment was computed from. */
export function hashInputs(inputs: unknown): string {
  const text = canonicalize(inputs);
  if (text === undefined) throw new TypeError('hashInputs: the inputs are not JSON.');
  return createHash('sha256').update(text).digest('hex');
}
