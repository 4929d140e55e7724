import { SaxesParser } from 'saxes';

export interface MarkupEvents {
  open(name: string, attributes: Readonly<Record<string, string>>, line: number): void;
  close(name: string): void;
  /** Waited for after each tag. */
  settle(): Promise<void> | void;
  /** Some of the text between two tags; `lineAt` counts to a place in these bytes. */
  text(bytes: Buffer, from: number, to: number, lineAt: (at: number) => number): void | Promise<void>;
  /** Takes all bytes from a place on which is no longer markup. */
  raw(bytes: Buffer): void | Promise<void>;
  /** Throws what rejects the file. */
  fail(line: number, found: string, expected: string): never;
}

export interface Markup {
  push(chunk: Buffer): Promise<void>;
  end(): void;
  /** Hands on everything after the tag that is being told of as it is. */
  leaveMarkup(): void;
}

const longestTag = 64 * 1024;
const deepest = 64;
const [lessThan, greaterThan, lineFeed] = [0x3c, 0x3e, 10];
const openings = [{ begin: '<!--', end: '-->' }, { begin: '<?', end: '?>' }] as const;

/**
 * Walks through XML as its bytes arrive. Only tags are parsed as text; what stands between them, most of the file, is handed
 * on as bytes and never kept. There is no document type and so no entity but the five of XML.
 */
export function createMarkup(events: MarkupEvents): Markup {
  const parser = new SaxesParser<{ position: false; xmlns: false }>({ position: false, xmlns: false });
  let carry: Buffer = Buffer.alloc(0);
  let line = 1;
  let depth = 0;
  let isRaw = false;
  let ended = false;

  parser.on('error', (error) => events.fail(line, shorten(error.message), 'well-formed XML'));
  parser.on('opentag', ({ name, attributes }) => {
    depth += 1;
    if (depth > deepest) events.fail(line, `more than ${deepest} tags inside each other`, 'the few that VTK has');
    events.open(name, attributes, line);
  });
  parser.on('closetag', ({ name }) => {
    depth -= 1;
    events.close(name);
  });

  const parseTag = (tag: string): void => {
    if (tag.startsWith('<!')) events.fail(line, shorten(tag), 'tags and numbers alone, without DOCTYPE or CDATA');
    parser.write(tag);
  };

  /** The end of the tag or comment that begins at `from`, −1 where it has not arrived. */
  const endOfTag = (bytes: Buffer, from: number): number => {
    const beginning = bytes.toString('latin1', from, from + 4);
    const special = openings.find(({ begin }) => beginning.startsWith(begin));
    if (special !== undefined) {
      const at = bytes.indexOf(special.end, from + special.begin.length, 'latin1');
      return at < 0 ? -1 : at + special.end.length;
    }
    if (bytes.length - from < 4) return -1;
    return endOfPlainTag(bytes, from);
  };

  const lineAfter = (bytes: Buffer, from: number, to: number, first: number): number => {
    let count = first;
    for (let at = bytes.indexOf(lineFeed, from); at >= 0 && at < to; at = bytes.indexOf(lineFeed, at + 1)) count += 1;
    return count;
  };

  const takeText = async (bytes: Buffer, from: number, to: number): Promise<void> => {
    if (to <= from) return;
    const first = line;
    await events.text(bytes, from, to, (at) => lineAfter(bytes, from, at, first));
    line = lineAfter(bytes, from, to, first);
  };

  return {
    async push(chunk) {
      if (isRaw) return events.raw(chunk);
      const bytes = carry.length === 0 ? chunk : Buffer.concat([carry, chunk]);
      let at = 0;
      while (at < bytes.length) {
        const tag = bytes.indexOf(lessThan, at);
        await takeText(bytes, at, tag < 0 ? bytes.length : tag);
        at = tag < 0 ? bytes.length : tag;
        if (tag < 0) break;
        const stop = endOfTag(bytes, tag);
        if (stop < 0) {
          if (bytes.length - tag > longestTag) events.fail(line, 'a tag of more than 64 KiB', 'its closing “>”');
          break;
        }
        const before = line;
        line = lineAfter(bytes, tag, stop, before);
        const text = bytes.toString('utf8', tag, stop);
        if (!openings.some(({ begin }) => text.startsWith(begin))) parseTag(text);
        await events.settle();
        at = stop;
        if (isRaw) {
          carry = Buffer.alloc(0);
          return events.raw(bytes.subarray(at));
        }
      }
      // A copy: the source may use its buffer again.
      carry = Buffer.from(bytes.subarray(at));
    },
    end() {
      if (ended || isRaw) return;
      ended = true;
      if (carry.length > 0) events.fail(line, 'the end of the file', 'the closing “>” of a tag');
      parser.close();
    },
    leaveMarkup() {
      isRaw = true;
    },
  };
}

function endOfPlainTag(bytes: Buffer, from: number): number {
  let quote = 0;
  for (let at = from + 1; at < bytes.length; at += 1) {
    const byte = bytes[at] as number;
    if (quote !== 0) {
      if (byte === quote) quote = 0;
    } else if (byte === 0x22 || byte === 0x27) quote = byte;
    else if (byte === greaterThan) return at + 1;
  }
  return -1;
}

function shorten(text: string): string {
  const flat = text.replace(/^\S*:\s(?=\S)/, '').replace(/\s+/g, ' ');
  return flat.length <= 50 ? flat : `${flat.slice(0, 50)}…`;
}
