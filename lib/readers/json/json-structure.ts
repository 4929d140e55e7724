import { rejectAtOnce, type ReasonCollector } from '../reason-collector';

export type JsonScalar = 'number' | 'string' | 'word';

/** What a document is made of, in its order. `bytes[from, to)` is the scalar as written, a string without its quotes. */
export interface JsonEvents {
  open(kind: 'object' | 'array', line: number): void;
  close(): void;
  key(name: string): void;
  scalar(kind: JsonScalar, bytes: Buffer, from: number, to: number, line: number): void;
}

export interface JsonStructure {
  push(chunk: Buffer): void;
  end(): void;
}

type Expected = 'a value' | 'a value or “]”' | 'a name or “}”' | 'a name' | '“:”' | '“,” or the end of the list' | 'the end of the file';
const longestScalar = 64 * 1024;
const deepest = 64;
const [minus, comma] = [45, 44];
const inScalar = /[-+.\w]/;
const isScalarByte = Uint8Array.from({ length: 256 }, (_, byte) => Number(byte < 128 && inScalar.test(String.fromCharCode(byte))));

/** Walks through JSON as its bytes arrive, keeping no more than one name or number; rejects the first thing out of place. */
export function createJsonStructure(events: JsonEvents, reasons: ReasonCollector): JsonStructure {
  const stack: ('object' | 'array')[] = [];
  let expected: Expected = 'a value';
  let carry = Buffer.alloc(0);
  let line = 1;

  const fail = (found: string): never => rejectAtOnce(reasons, { code: 'malformed-json', line, column: null, found, expected });
  const afterValue = () => {
    expected = stack.length === 0 ? 'the end of the file' : '“,” or the end of the list';
  };
  const wantsValue = () => expected === 'a value' || expected === 'a value or “]”';

  const punctuation = (byte: number) => {
    if (byte === comma && expected === '“,” or the end of the list') {
      expected = stack[stack.length - 1] === 'object' ? 'a name' : 'a value';
      return;
    }
    const found = String.fromCharCode(byte);
    if (found === '{' || found === '[') {
      if (!wantsValue()) fail(`“${found}”`);
      if (stack.length >= deepest) fail(`more than ${deepest} lists inside each other`);
      const kind = found === '{' ? 'object' : 'array';
      stack.push(kind);
      expected = kind === 'object' ? 'a name or “}”' : 'a value or “]”';
      events.open(kind, line);
    } else if (found === '}' || found === ']') {
      const kind = found === '}' ? 'object' : 'array';
      const mayClose = expected === '“,” or the end of the list' || expected === (kind === 'object' ? 'a name or “}”' : 'a value or “]”');
      if (!mayClose || stack.at(-1) !== kind) fail(`“${found}”`);
      stack.pop();
      events.close();
      afterValue();
    } else if (found === ':' && expected === '“:”') {
      expected = 'a value';
    } else fail(`“${found}”`);
  };

  const text = (bytes: Buffer, from: number, to: number) => {
    if (expected === 'a name' || expected === 'a name or “}”') {
      events.key(decode(bytes, from, to) ?? fail('a name with a wrong escape'));
      expected = '“:”';
    } else if (wantsValue()) {
      events.scalar('string', bytes, from, to, line);
      afterValue();
    } else fail('a text');
  };

  const bare = (bytes: Buffer, from: number, to: number) => {
    const start = bytes[from] === minus ? bytes[from + 1] : bytes[from];
    const isNumber = start !== undefined && ((start >= 48 && start <= 57) || start === 46);
    if (!wantsValue() || !(isNumber || isWord(bytes, from, to))) fail(`“${bytes.toString('latin1', from, Math.min(to, from + 40))}”`);
    events.scalar(isNumber ? 'number' : 'word', bytes, from, to, line);
    afterValue();
  };

  /** Reads what is complete and returns where the rest begins. */
  const scan = (bytes: Buffer, isLast: boolean): number => {
    let at = 0;
    while (at < bytes.length) {
      const byte = bytes[at] as number;
      if (byte === 10) line += 1;
      if (byte === 32 || byte === 10 || byte === 13 || byte === 9) at += 1;
      else if (byte === 34) {
        const stop = endOfString(bytes, at + 1);
        if (stop < 0) return at;
        text(bytes, at + 1, stop);
        at = stop + 1;
      } else if (isScalarByte[byte] === 1) {
        let stop = at + 1;
        while (stop < bytes.length && isScalarByte[bytes[stop] as number] === 1) stop += 1;
        if (stop === bytes.length && !isLast) return at;
        bare(bytes, at, stop);
        at = stop;
      } else {
        punctuation(byte);
        at += 1;
      }
    }
    return at;
  };

  return {
    push(chunk) {
      const bytes = carry.length === 0 ? chunk : Buffer.concat([carry, chunk]);
      const rest = scan(bytes, false);
      if (bytes.length - rest > longestScalar) fail('a name or text of more than 64 KiB');
      // A copy: the source may use its buffer again.
      carry = Buffer.from(bytes.subarray(rest));
    },
    end() {
      if (scan(carry, true) < carry.length) fail('a text without its closing quote');
      if (expected !== 'the end of the file') fail('the end of the file');
    },
  };
}

const isWord = (bytes: Buffer, from: number, to: number) => /^(?:true|false|null|[-+]?(?:nan|inf|infinity))$/i.test(bytes.toString('latin1', from, Math.min(to, from + 40)));

function endOfString(bytes: Buffer, from: number): number {
  for (let at = from; at < bytes.length; at += 1) {
    if (bytes[at] === 92) at += 1;
    else if (bytes[at] === 34) return at;
  }
  return -1;
}

function decode(bytes: Buffer, from: number, to: number): string | null {
  if (!bytes.subarray(from, to).includes(92)) return bytes.toString('utf8', from, to);
  try {
    return JSON.parse(`"${bytes.toString('utf8', from, to)}"`) as string;
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
