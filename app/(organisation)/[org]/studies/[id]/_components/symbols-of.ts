import type { Study } from '@/lib/domain/studies/schema';

/** Names that are set as variables in sentences about a study. */
export function symbolsOf({ definition }: Pick<Study, 'definition'>): string[] {
  return [...definition.fields.map(({ field }) => field), 'h'];
}
