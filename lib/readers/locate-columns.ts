import { resolveColumn } from '../domain/columns/resolve-column';
import type { ReasonCollector } from './reason-collector';

/** The index of every wanted column; reports and throws where one is absent or stands there twice. */
export function locateColumns(header: readonly string[], wanted: readonly string[], line: number | null, reasons: ReasonCollector): number[] {
  const list = header.length === 0 ? 'no columns' : header.join(', ');
  const found = wanted.map((name) => ({ name, index: resolveColumn(header, name) }));
  const absent = found.filter(({ index }) => index === 'absent').map(({ name }) => name);
  if (absent.length > 0) {
    reasons.add({ code: 'column-missing', line, column: null, found: list, expected: absent.join(', ') }, absent.length);
  }
  for (const { name, index } of found) {
    if (index === 'ambiguous') reasons.add({ code: 'duplicate-column', line, column: null, found: list, expected: `one column ${name}` });
  }
  reasons.throwIfAny();
  return found.flatMap(({ index }) => (typeof index === 'number' ? [index] : []));
}
