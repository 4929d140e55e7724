import type { Delimiter } from './source';

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

function unquote(field: string): string {
  const trimmed = field.trim();
  return trimmed.length >= 2 && trimmed.startsWith('"') && trimmed.endsWith('"') ? trimmed.slice(1, -1).trim() : trimmed;
}
