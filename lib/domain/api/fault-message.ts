import type { z } from 'zod';

const kinds: Record<string, string> = {
  string: 'text', number: 'a number', int: 'a whole number', boolean: 'yes or no', array: 'a list', object: 'a group of members', record: 'a group of members', date: 'a moment',
};

const quoted = (input: unknown) => (typeof input === 'string' && input !== '' && input.length <= 60 ? ` Found “${input}”.` : typeof input === 'number' ? ` Found ${input}.` : '');
const plural = (count: number | bigint, one: string) => `${count} ${one}${Number(count) === 1 ? '' : 's'}`;

function tooSmall(issue: z.core.$ZodRawIssue<z.core.$ZodIssueTooSmall>): string {
  const least = issue.minimum;
  if (issue.origin === 'string') return Number(least) <= 1 ? 'Missing. Type something here.' : `Too short. Expected at least ${plural(least, 'character')}.`;
  if (issue.origin === 'array') return `Too few. Expected at least ${least}.`;
  return `Too small.${quoted(issue.input)} Expected a number ${issue.inclusive ? `of at least ${least}` : `above ${least}`}.`;
}

function tooBig(issue: z.core.$ZodRawIssue<z.core.$ZodIssueTooBig>): string {
  const most = issue.maximum;
  if (issue.origin === 'string') return `Too long. Expected at most ${plural(most, 'character')}.`;
  if (issue.origin === 'array') return `Too many. Expected at most ${most}.`;
  return `Too large.${quoted(issue.input)} Expected a number ${issue.inclusive ? `of at most ${most}` : `below ${most}`}.`;
}

/** What any of the forms of a member would have been. */
function formsOf({ errors }: z.core.$ZodRawIssue<z.core.$ZodIssueInvalidUnion>): string {
  const expected = errors.flatMap(([first]) => (first?.code === 'invalid_type' ? [kinds[first.expected] ?? first.expected] : first?.code === 'invalid_value' ? first.values.map(String) : []));
  return [...new Set(expected)].join(' or ') || 'another form';
}

/** What was wrong with a value and what was expected, in words; undefined leaves it to the schema's own text. */
export function faultMessage(issue: z.core.$ZodRawIssue): string | undefined {
  switch (issue.code) {
    case 'invalid_type': {
      if (issue.input === undefined) return 'Missing. Fill this in.';
      if (issue.expected === 'number' || issue.expected === 'int') return `Not ${kinds[issue.expected]}.${quoted(issue.input)} Expected ${kinds[issue.expected]}, such as ${issue.expected === 'int' ? 16 : 0.1}.`;
      return `Not readable.${quoted(issue.input)} Expected ${kinds[issue.expected] ?? issue.expected}.`;
    }
    case 'too_small': return tooSmall(issue);
    case 'too_big': return tooBig(issue);
    case 'invalid_value': return `Not one of the choices.${quoted(issue.input)} Expected ${issue.values.map(String).join(', ')}.`;
    case 'invalid_union': return `Not readable.${quoted(issue.input)} Expected ${formsOf(issue)}.`;
    case 'unrecognized_keys': return `Not known: ${issue.keys.join(', ')}. Leave it out.`;
    default: return undefined;
  }
}
