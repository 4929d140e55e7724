export interface Sample { name: string; labels: Record<string, string>; value: number }

const nameGrammar = '[a-zA-Z_:][a-zA-Z0-9_:]*';
const valueGrammar = '[+-]?(?:\\d+(?:\\.\\d*)?(?:[eE][+-]?\\d+)?|Inf)|NaN';
const pairGrammar = '[a-zA-Z_][a-zA-Z0-9_]*="(?:[^"\\\\\\n]|\\\\["\\\\n])*"';
const pair = /([a-zA-Z_][a-zA-Z0-9_]*)="((?:[^"\\\n]|\\["\\n])*)"/g;
const help = new RegExp(`^# HELP (${nameGrammar}) (?:[^\\\\\\n]|\\\\[\\\\n])*$`);
const type = new RegExp(`^# TYPE (${nameGrammar}) (counter|gauge|histogram|summary|untyped)$`);
const sample = new RegExp(`^(${nameGrammar})(?:\\{(${pairGrammar}(?:,${pairGrammar})*)\\})? (${valueGrammar})$`);

function familyOf(name: string, types: Map<string, string>): string {
  const base = name.replace(/_(bucket|sum|count)$/, '');
  return types.get(base) === 'histogram' || types.get(base) === 'summary' ? base : name;
}

/**
 * Reads the text exposition format 0.0.4 line by line, and refuses what its grammar does not allow: a sample whose family
 * has no type before it, a family told twice or in two places, one sample twice, a missing line end.
 */
export function parseMetrics(text: string): Sample[] {
  if (!text.endsWith('\n')) throw new Error('The last line does not end.');
  const types = new Map<string, string>();
  const closed = new Set<string>();
  const seen = new Set<string>();
  const samples: Sample[] = [];
  let family = '';
  const enter = (name: string, line: string) => {
    if (name === family) return;
    if (closed.has(name)) throw new Error(`${name} stands in two places: ${line}`);
    closed.add(family);
    family = name;
  };
  for (const line of text.split('\n')) {
    if (line === '') continue;
    const helped = help.exec(line)?.[1];
    const typed = type.exec(line);
    if (helped !== undefined) enter(helped, line);
    else if (typed?.[1] !== undefined) {
      enter(typed[1], line);
      if (types.has(typed[1])) throw new Error(`Typed twice: ${line}`);
      types.set(typed[1], typed[2] ?? '');
    } else {
      const [, name, labelText = '', value = ''] = sample.exec(line) ?? [];
      if (name === undefined) throw new Error(`Not a line of the format: ${line}`);
      enter(familyOf(name, types), line);
      if (!types.has(family)) throw new Error(`No type before: ${line}`);
      if (seen.has(`${name}{${labelText}}`)) throw new Error(`Told twice: ${line}`);
      seen.add(`${name}{${labelText}}`);
      const labels = Object.fromEntries([...labelText.matchAll(pair)].map(([, label = '', content = '']) => [label, content]));
      samples.push({ name, labels, value: Number(value.replace('Inf', 'Infinity')) });
    }
  }
  return samples;
}

/** The sum of a name's samples that carry these labels; a counter that has not begun is 0. */
export function sumOf(samples: Sample[], name: string, labels: Record<string, string> = {}): number {
  return samples
    .filter((one) => one.name === name && Object.entries(labels).every(([label, value]) => one.labels[label] === value))
    .reduce((sum, { value }) => sum + value, 0);
}
