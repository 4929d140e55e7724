import type { DecimalMarkName, Delimiter, GivenDialect } from '../columns/given-dialect';

interface ShownTable { delimiter: Delimiter; hasHeader: boolean; headerLine: number | null; decimalMark: DecimalMarkName | null }

export const delimiterWords = { comma: 'comma', semicolon: 'semicolon', tab: 'tab', 'white space': 'white space' } as const satisfies Record<Delimiter, string>;

/** What was said of how tables are written, in words. */
export function describeGiven({ delimiter, hasHeader, decimalMark }: GivenDialect): string {
  const parts = [
    ...(delimiter === undefined ? [] : [`${delimiterWords[delimiter]} between columns`]),
    ...(decimalMark === undefined ? [] : [`decimal ${decimalMark}`]),
    ...(hasHeader === undefined ? [] : [hasHeader ? 'names in the first line' : 'no line of names']),
  ];
  return parts.join(', ');
}

/** How a table is written, in words: “Semicolon between columns, decimal comma, names in line 3”. */
export function describeTable({ delimiter, hasHeader, headerLine, decimalMark }: ShownTable): string {
  const word = delimiterWords[delimiter];
  return [
    `${word.charAt(0).toUpperCase()}${word.slice(1)} between columns`,
    ...(decimalMark === null ? [] : [`decimal ${decimalMark}`]),
    !hasHeader ? 'no line of names' : headerLine === null ? 'with a line of names' : `names in line ${headerLine}`,
  ].join(', ');
}
