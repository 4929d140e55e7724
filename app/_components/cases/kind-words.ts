import type { CaseKind } from '@/lib/domain/cases/definition';

/** What each kind of case shows. */
export const kindWords: Record<CaseKind, string> = {
  order: 'Errors fall at the formal order of the scheme.',
  exactness: 'The solution is reproduced to round-off: patch test, free stream, conservation.',
  benchmark: 'A quantity approaches its known value.',
  solution: 'A quantity without a known value: its grid convergence index. Never evidence that an option is verified.',
};
