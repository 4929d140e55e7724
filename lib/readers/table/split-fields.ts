import type { Delimiter } from '../../domain/columns/given-dialect';

export const delimiterCharacter = { comma: ',', semicolon: ';', tab: '\t' } as const satisfies Partial<Record<Delimiter, string>>;

/** The fields of one line as text, without white space and quotes around them. */
export function splitFields(line: string, delimiter: Delimiter): string[] {
  if (delimiter === 'white space') {
    const trimmed = line.trim();
    return trimmed === '' ? [] : (trimmed.match(/"[^"]*"|\S+/g) ?? []).map(unquote);
  }
  const character = delimiterCharacter[delimiter];
  if (!line.includes('"')) return line.split(character).map((field) => field.trim());
  const fields: string[] = [];
  let from = 0;
  let isQuoted = false;
  for (let at = 0; at <= line.length; at += 1) {
    if (line.charAt(at) === '"') isQuoted = !isQuoted;
    if (at < line.length && (isQuoted || line.charAt(at) !== character)) continue;
    fields.push(unquote(line.slice(from, at)));
    from = at + 1;
  }
  // An open quote swallows what follows; the line is then as wide as it would be without quotes.
  return isQuoted ? line.split(character).map(unquote) : fields;
}

const withUnit = /"[^"]*"|\S+(?:\s+(?:\[[^\]]*\]|\([^)]*\)))?/g;

/**
 * The fields of a line of names. Between names parted by white space or tabs a comma is no part of the name, and where
 * `width`, the columns of the rows, says so, neither is the white space before a unit: “u [m/s]” is one name.
 */
export function splitNames(line: string, delimiter: Delimiter, width: number | null): string[] {
  const plain = splitFields(line, delimiter);
  if (delimiter !== 'white space' && delimiter !== 'tab') return plain;
  const joined = delimiter === 'white space' && width !== null && plain.length !== width ? (line.match(withUnit) ?? []).map(unquote) : plain;
  return (joined.length === width ? joined : plain).map((name) => name.replace(/[,;]$/, ''));
}

function unquote(field: string): string {
  const trimmed = field.trim();
  return trimmed.length >= 2 && trimmed.startsWith('"') && trimmed.endsWith('"') ? trimmed.slice(1, -1).replaceAll('""', '"').trim() : trimmed;
}
