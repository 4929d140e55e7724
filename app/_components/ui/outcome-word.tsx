import { Mark, type MarkProps } from './mark';

const looks = {
  pass: { word: 'pass', className: '', large: 'text-pass-text' },
  exact: { word: 'pass, exact', className: '', large: 'text-pass-text' },
  fail: { word: 'fail', className: 'font-semibold text-fail-text', large: 'text-fail-text' },
  inconclusive: { word: 'inconclusive', className: 'font-semibold text-open-text', large: 'text-open-text' },
  'inconclusive-solution': { word: 'inconclusive', className: 'font-semibold text-open-text', large: 'text-open-text' },
  'meets-target': { word: 'meets target', className: '', large: 'text-ink' },
  'misses-target': { word: 'misses target', className: 'font-semibold text-fail-text', large: 'text-fail-text' },
  'not-run': { word: 'not run', className: 'text-graphite', large: 'text-graphite' },
} as const;

/** Mark and word. `large` is the form that opens the statement of a page: "Pass." in its own colour. */
export function OutcomeWord({ large, ...mark }: Omit<MarkProps, 'hidden' | 'size'> & { large?: boolean }) {
  const look = looks[mark.mark];
  const extra = [mark.waived && 'waived', mark.struck, mark.signed && 'signed'].filter(Boolean).join(', ');
  const word = large ? `${look.word.charAt(0).toUpperCase()}${look.word.slice(1)}.` : look.word;
  return (
    <span className="whitespace-nowrap">
      <Mark {...mark} size={large ? 24 : 16} hidden />{' '}
      <span className={large ? `font-semibold ${look.large}` : look.className}>{word}</span>
      {extra && <span className={large ? 'sr-only' : 'text-graphite'}>, {extra}</span>}
    </span>
  );
}
