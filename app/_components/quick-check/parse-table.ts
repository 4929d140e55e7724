export interface PastedTable {
  rows: string[][];
  separator: 'tab' | 'semicolon' | 'comma' | 'space';
  /** Whether a first line of names was left out. */
  hadHeader: boolean;
}

const number = /^[+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:[eEdD][+-]?\d+)?$/;

/** A cell as a person or a program writes it, as a number: decimal comma, Fortran's D, spaces between thousands. Null where it is none. */
export function readNumber(text: string): number | null {
  const plain = text.trim().replace(/[\s\u00a0\u202f]/g, '').replace('\u2212', '-');
  if (!number.test(plain)) return null;
  const value = Number(plain.replace(',', '.').replace(/[dD]/, 'e'));
  return Number.isFinite(value) ? value : null;
}

function separatorOf(lines: readonly string[]): PastedTable['separator'] {
  const everyLineHas = (sign: string) => lines.every((line) => line.includes(sign));
  if (everyLineHas('\t')) return 'tab';
  if (everyLineHas(';')) return 'semicolon';
  // In “0,5 1,2” the gap separates and the comma is a decimal sign.
  if (everyLineHas(',') && lines.some((line) => !/[^\s,]\s+[^\s,]/.test(line))) return 'comma';
  return 'space';
}

const cuts = { tab: /\t/, semicolon: /;/, comma: /,/, space: /\s+/ } as const;

/** A pasted table, or null where the text is a single value. Comment lines (#, %, !) and a line of names are left out. */
export function parsePasted(text: string): PastedTable | null {
  const lines = text.split(/\r?\n/).filter((line) => line.trim() !== '' && !/^\s*[#%!]/.test(line));
  if (lines.length === 0) return null;
  const separator = separatorOf(lines);
  const rows = lines.map((line) => line.trim().split(cuts[separator]).map((cell) => cell.trim()));
  const hadHeader = rows.length > 1 && (rows[0]?.every((cell) => cell === '' || readNumber(cell) === null) ?? false);
  const kept = hadHeader ? rows.slice(1) : rows;
  return kept.length === 1 && kept[0]?.length === 1 ? null : { rows: kept, separator, hadHeader };
}
