import { oneOf, upTo, type Random } from '@/tests/support/random';

/** Pieces that have meaning to one reader or another. */
const words = [
  'nan', 'NaN', '-inf', 'Infinity', '1e999', '-1e-999', '1d+05', '1D400', '0x1f', '1.', '.5', '+.', '--1', '1e', '1,5', '1;5', ',', ';', '\t', ' ', '\n', '\r', '\r\n', '\0',
  '#', '%', '//', '"', "'", '""', '\\', '\\u0000', '\\ud800', '{', '}', '[', ']', ':', 'null', 'true', '[[[[', '{"a":', '\ufeff', '\u2028', 'x', 'u', 'w', 'e', '<', '>', '</', '/>', '&lt;', '<!--',
  '<![CDATA[', 'NumberOfCells="', '4294967296', '-1', '9007199254740993', '18446744073709551615', '0', '00', '="', 'offset', 'AAAA', '====', '_',
].map((word) => Buffer.from(word));
const interesting = [0, 1, 0x7f, 0x80, 0xff, 10, 13, 32, 44, 34] as const;
const wide = [0, 1, 0x7fffffff, 0x80000000, 0xffffffff, 0x100, 0x10000] as const;
const longest = 256 * 1024;

type Mutation = (bytes: Buffer, random: Random) => Buffer;

function splice(bytes: Buffer, at: number, removed: number, added: Uint8Array): Buffer {
  return Buffer.concat([bytes.subarray(0, at), added, bytes.subarray(at + removed)]);
}

function changed(bytes: Buffer, change: (copy: Buffer) => void): Buffer {
  const copy = Buffer.from(bytes);
  if (copy.length > 0) change(copy);
  return copy;
}

const slice = (bytes: Buffer, random: Random) => {
  const from = upTo(random, bytes.length);
  return bytes.subarray(from, from + upTo(random, Math.min(400, bytes.length - from)));
};

const mutations: readonly Mutation[] = [
  (bytes, random) => changed(bytes, (copy) => { copy[upTo(random, copy.length - 1)] = upTo(random, 255); }),
  (bytes, random) => changed(bytes, (copy) => { copy[upTo(random, copy.length - 1)] = oneOf(random, interesting); }),
  (bytes, random) => changed(bytes, (copy) => { const at = upTo(random, copy.length - 1); copy[at] = (copy[at] ?? 0) ^ (1 << upTo(random, 7)); }),
  (bytes, random) => changed(bytes, (copy) => { if (copy.length > 4) copy.writeUInt32LE(oneOf(random, wide), upTo(random, copy.length - 4)); }),
  (bytes, random) => bytes.subarray(0, upTo(random, bytes.length)),
  (bytes, random) => splice(bytes, upTo(random, bytes.length), 0, oneOf(random, words)),
  (bytes, random) => splice(bytes, upTo(random, bytes.length), upTo(random, 12), oneOf(random, words)),
  (bytes, random) => splice(bytes, upTo(random, bytes.length), upTo(random, 60), Buffer.alloc(0)),
  (bytes, random) => splice(bytes, upTo(random, bytes.length), 0, slice(bytes, random)),
  (bytes, random) => splice(bytes, upTo(random, bytes.length), 0, Buffer.concat(Array.from({ length: upTo(random, 300) }, () => oneOf(random, [words[upTo(random, words.length - 1)] as Buffer])))),
  (bytes, random) => { const [from, piece] = [upTo(random, bytes.length), slice(bytes, random)]; return splice(bytes, from, piece.length, piece); },
];

/** A file with some of its bytes, tokens or stretches changed; now and then another file's end on it. */
export function mutate(bytes: Buffer, other: Buffer, random: Random): Buffer {
  let result = bytes;
  for (let left = 1 + upTo(random, 5); left > 0; left -= 1) result = oneOf(random, mutations)(result, random);
  if (random() < 0.05) result = Buffer.concat([result.subarray(0, upTo(random, result.length)), other.subarray(upTo(random, other.length))]);
  return result.subarray(0, longest);
}
