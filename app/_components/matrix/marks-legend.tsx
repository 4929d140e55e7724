import { OutcomeWord } from '../ui/outcome-word';

const marks = ['pass', 'exact', 'fail', 'inconclusive', 'not-run', 'meets-target', 'misses-target'] as const;

/** What the marks in the cells mean. */
export function MarksLegend() {
  return (
    <div>
      <p><b>Marks</b></p>
      <ul className="mt-1 flex flex-wrap gap-x-5 gap-y-1 wide:flex-col">
        {marks.map((mark) => <li key={mark}><OutcomeWord mark={mark} lineStart /></li>)}
        <li><span aria-hidden className="inline-block w-4 text-rule">–</span> case younger than the release</li>
      </ul>
      <p className="mt-2">Beside a mark: the lowest observed order over the formal one.</p>
    </div>
  );
}
