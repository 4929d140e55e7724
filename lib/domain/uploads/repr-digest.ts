/**
 * The SHA-256 that a `Repr-Digest` field (RFC 9530) states, in hexadecimal; null where the field states none, since other
 * algorithms may be passed over. Throws RangeError where the digest stated is not one.
 */
export function readReprDigest(field: string): string | null {
  const member = field.split(',').map((part) => part.trim()).find((part) => part.toLowerCase().startsWith('sha-256='));
  if (member === undefined) return null;
  const base64 = /^sha-256=:([A-Za-z0-9+/]{43}=):$/i.exec(member)?.[1];
  if (base64 === undefined) throw new RangeError(`Repr-Digest is ${field}; expected sha-256=:…: with 32 bytes in Base64.`);
  return Array.from(atob(base64), (character) => character.charCodeAt(0).toString(16).padStart(2, '0')).join('');
}
