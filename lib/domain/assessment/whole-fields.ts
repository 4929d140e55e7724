import type { Region } from '@/lib/numerics/assessment';

/** Norms of the whole domain, which alone are judged; those of its parts are shown beside them. */
export function wholeFields<Field extends { region: Region }>(fields: readonly Field[]): Field[] {
  return fields.filter(({ region }) => region === 'all');
}
