import type { DecimalMarkName, Delimiter } from '../columns/given-dialect';

interface ShownTable { delimiter: Delimiter; hasHeader: boolean; headerLine: number | null; decimalMark: DecimalMarkName | null }

export const delimiterWords = { comma: 'comma', semicolon: 'semicolon', tab: 'tab', 'white space': 'white space' } as const satisfies Record<Delimiter, string>;

/** How a table is written, in words: “Semicolon between columns, decimal comma, names in line 3”. */
export function describeTable({ delimiter, hasHeader, headerLine, decimalMark }: ShownTable): string {
  const word = delimiterWords[delimiter];
  return [
    `${word.charAt(0).toUpperCase()}${word.slice(1)} between columns`,
    ...(decimalMark === null ? [] : [`decimal ${decimalMark}`]),
    !hasHeader ? 'no line of names' : headerLine === null ? 'with a line of names' : `names in line ${headerLine}`,
  ].join(', ');
}
