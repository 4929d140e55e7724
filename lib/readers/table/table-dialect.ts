import { refuseManyColumns } from '../column-limit';
import { parseNumber, type NumberReading } from '../parse-number';
import type { Head } from '../read-head';
import { RejectedFile } from '../rejected-file';
import { lineTooLong } from './line-too-long';
import { splitFields, splitNames } from './split-fields';
import type { DecimalMarkName, Delimiter, GivenDialect } from '../../domain/columns/given-dialect';

export interface TableDialect {
  delimiter: Delimiter;
  hasHeader: boolean;
  header: string[];
  /** The line that names the columns, or the first row where none does. */
  headerLine: number;
  /** The byte that ends a line: a carriage return only where no line ends in a line feed. */
  lineEnd: 10 | 13;
  /** Lines before the first row of numbers. */
  linesBefore: number;
  /** The first rows as text. */
  firstRows: string[][];
  /** The decimal mark of all numbers, where it was said and is not to be found out from the first that has one. */
  decimalMark?: DecimalMarkName;
}

const shownRows = 10;
const triedLines = 50;
const comment = /^\s*(?:#+|%+|!+|\/\/)/;

interface NumberedLine { text: string; number: number }

/** Finds out how a text table is written, but for what was given: what parts its columns, what they are called, where the numbers begin. */
export function detectTableDialect(head: Head, given: GivenDialect = {}): TableDialect {
  const lineEnd = head.bytes.includes(10) || !head.bytes.includes(13) ? 10 : 13;
  const { content, lastComment } = readFirstLines(head, lineEnd);
  const [first, second] = content;
  if (first === undefined) {
    throw new RejectedFile([{
      code: 'empty-file', count: 1, line: null, column: null, found: 'no line with values', expected: 'a header and rows of numbers',
    }]);
  }
  const delimiter = given.delimiter ?? detectDelimiter(content, given.decimalMark !== 'comma');
  const fields = splitFields(first.text, delimiter);
  refuseManyColumns(fields.length);
  const names = (text: string, row: NumberedLine | undefined) => splitNames(text, delimiter, row ? splitFields(row.text, delimiter).length : null);
  const rows = (lines: NumberedLine[]) => lines.slice(0, shownRows).map((line) => splitFields(line.text, delimiter));
  // A comment just above the numbers that names as many columns as there are is their header.
  const named = lastComment === null || given.hasHeader === false ? [] : names(lastComment.text.replace(comment, ''), first);
  const isNamed = named.length === fields.length && new Set(named).size === named.length && named.every((name) => name !== '' && !isNumeric(name));
  const isText = !fields.some(isNumeric) && fields.some((field) => field !== '');
  const { decimalMark } = given;
  if (given.hasHeader ?? isText) {
    if (isText || !isNamed) {
      return {
        delimiter, lineEnd, decimalMark, hasHeader: true, header: nameColumns(names(first.text, second)), headerLine: first.number,
        linesBefore: second === undefined ? first.number : second.number - 1, firstRows: rows(content.slice(1)),
      };
    }
  }
  return {
    delimiter, lineEnd, decimalMark, hasHeader: isNamed, header: isNamed ? named : fields.map((_, index) => `c${index + 1}`),
    headerLine: isNamed && lastComment !== null ? lastComment.number : first.number,
    linesBefore: first.number - 1, firstRows: rows(content),
  };
}

/** The mark of the first number that has one, null where the first rows hold none. */
export function findDecimalMark(rows: readonly (readonly string[])[]): DecimalMarkName | null {
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  for (const field of rows.flat()) {
    const bytes = Buffer.from(field, 'latin1');
    parseNumber(bytes, 0, bytes.length, true, reading);
    if (reading.status === 'number' && reading.mark !== 'none') return reading.mark;
  }
  return null;
}

function readFirstLines(head: Head, lineEnd: 10 | 13): { content: NumberedLine[]; lastComment: NumberedLine | null } {
  const lines = head.bytes.toString('utf8').replace(/^\uFEFF/, '').split(lineEnd === 10 ? '\n' : '\r');
  if (!head.complete) {
    // The last line of a head may be cut; one without any other is longer than all that is read.
    lines.pop();
    if (lines.length === 0) throw new RejectedFile([lineTooLong(1)]);
  }
  const content: NumberedLine[] = [];
  let lastComment: NumberedLine | null = null;
  for (const [index, text] of lines.entries()) {
    const line = { text: text.replace(/\r$/, ''), number: index + 1 };
    if (line.text.trim() === '') continue;
    if (comment.test(line.text)) {
      if (content.length === 0) lastComment = line;
    } else if (content.push(line) === triedLines) break;
  }
  return { content, lastComment };
}

function detectDelimiter(lines: readonly NumberedLine[], mayBeComma: boolean): Delimiter {
  const isIn = (character: string) => lines.filter((line) => line.text.trim().includes(character)).length * 2 > lines.length;
  if (isIn('\t') && lines.every((line) => !line.text.includes(';'))) return 'tab';
  if (isIn(';')) return 'semicolon';
  if (!mayBeComma || !isIn(',')) return 'white space';
  // “0,5 1,25” is two numbers with a decimal comma: a comma that parts columns leaves no white space inside of one.
  const rows = lines.length > 1 ? lines.slice(1) : lines;
  const hasInnerSpace = (line: NumberedLine) => splitFields(line.text, 'comma').some((field) => /\d\s+[-+.\d]/.test(field));
  return rows.filter(hasInnerSpace).length * 2 > rows.length ? 'white space' : 'comma';
}

function nameColumns(fields: readonly string[]): string[] {
  const names = fields.map((field, index) => (field === '' ? `c${index + 1}` : field));
  // A separator at the end of the header is one column too many.
  return fields.length > 1 && fields.at(-1) === '' ? names.slice(0, -1) : names;
}

function isNumeric(field: string): boolean {
  const bytes = Buffer.from(field, 'latin1');
  const reading: NumberReading = { status: 'number', digits: 0, mark: 'none' };
  parseNumber(bytes, 0, bytes.length, true, reading);
  return reading.status !== 'not-a-number';
}
