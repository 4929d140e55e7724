import type { JsonContainer, JsonElement } from '../json/json-element';
import { rejectAtOnce, type ReasonCollector } from '../reason-collector';

export type SmallValue = string | number | boolean | null | SmallValue[] | { [name: string]: SmallValue };

/** What describes a file is small beside its numbers: far more than links and types of 100 000 datasets. */
const mostValues = 4_000_000;

/** Makes elements that build a value and hand it over; all of them together build no more than a bound. */
export function createSmallValues(reasons: ReasonCollector): (take: (value: SmallValue) => void) => JsonElement {
  let built = 0;
  const count = (line: number) => {
    built += 1;
    if (built > mostValues) {
      rejectAtOnce(reasons, { code: 'malformed-json', line, column: null, found: `more than ${mostValues} names, links and types`, expected: 'values of datasets' });
    }
  };
  const build = (take: (value: SmallValue) => void): JsonElement => ({
    scalar(kind, bytes, from, to, line) {
      count(line);
      const text = bytes.toString('utf8', from, to);
      if (kind === 'number') take(Number(text));
      else if (kind === 'string') take(unescape(text));
      else take(text === 'true' ? true : text === 'false' ? false : null);
    },
    open(kind, line): JsonContainer {
      count(line);
      if (kind === 'array') {
        const list: SmallValue[] = [];
        return { child: () => build((value) => list.push(value)), close: () => take(list) };
      }
      const members = new Map<string, SmallValue>();
      return { child: (name) => build((value) => members.set(name, value)), close: () => take(Object.fromEntries(members)) };
    },
  });
  return build;
}

function unescape(text: string): string {
  if (!text.includes('\\')) return text;
  try {
    return String(JSON.parse(`"${text}"`));
  } catch (error) {
    if (error instanceof SyntaxError) return text;
    throw error;
  }
}

/** The member of an object; undefined where there is none, or no object. */
export function memberOf(value: SmallValue | undefined, name: string): SmallValue | undefined {
  return typeof value === 'object' && value !== null && !Array.isArray(value) && Object.hasOwn(value, name) ? value[name] : undefined;
}

export const textOf = (value: SmallValue | undefined): string | null => (typeof value === 'string' ? value : null);
export const listOf = (value: SmallValue | undefined): SmallValue[] => (Array.isArray(value) ? value : []);
