import { Busy } from '@/app/_components/ui/busy';
import { Notice } from '@/app/_components/ui/notice';
import { Statement } from '@/app/_components/ui/page-title';
import { TextLink } from '@/app/_components/ui/text-link';
import { joinWords } from '@/lib/domain/assessment/series-name';
import { formatCount } from '@/lib/domain/numbers/format-count';
import { waitWords } from '@/lib/domain/numbers/wait-words';
import type { Grid, Study } from '@/lib/domain/studies/schema';
import type { Reading } from './use-study-events';

interface StudyProgressProps { study: Study; readings: ReadonlyMap<string, Reading> }

/** Where a study stands that has no outcome yet. */
export function StudyProgress({ study, readings }: StudyProgressProps) {
  const { state, failure, grids } = study;
  if (state === 'assessment-failed') {
    return <div className="mt-6"><Notice title="Not assessed.">{failure ?? 'The assessment could not be made.'} Mend what it names in a new revision, or run it again.</Notice></div>;
  }
  if (state === 'abandoned') {
    return <Statement lead={failure ?? undefined}>This revision was left without an outcome.</Statement>;
  }
  const taking = grids.filter((grid) => grid.excluded === null);
  const done = taking.filter((grid) => grid.state === 'read' || grid.state === 'typed');
  const reading = taking.find((grid) => grid.state === 'reading');
  if (state === 'assessing') {
    return <div className="mt-6"><Busy label="Assessing">Assessing {taking.length} grids. You may leave this page; the outcome will stand here.</Busy></div>;
  }
  const now = reading && (readings.get(reading.label) ?? { rowsRead: reading.upload?.rowsRead ?? 0, share: null });
  return (
    <Statement lead={<><WhatIsNeeded taking={taking} /><PlaceInLine waiting={study.waiting} /></>}>
      {headline(taking, done.length)}
      {reading && now && now.rowsRead > 0 && <span aria-live="polite"> Reading grid {reading.label}, {formatCount(now.rowsRead)} rows.</span>}
    </Statement>
  );
}

/** Said once it takes longer than usual. */
const patienceSeconds = 5;

function PlaceInLine({ waiting }: Pick<Study, 'waiting'>) {
  if (!waiting || waiting.seconds < patienceSeconds) return null;
  const { ahead, seconds, oldestSeconds, workerSeen } = waiting;
  return (
    <span role="status" className="mt-2 block">
      {ahead === 0
        ? `The file that waits is the next to be read; it has waited ${waitWords(seconds)}. `
        : `${formatCount(ahead)} ${ahead === 1 ? 'file is' : 'files are'} before the one that waits here; the oldest has waited ${waitWords(oldestSeconds)}. `}
      {workerSeen === false && <><b>No worker has been seen for 30 seconds.</b> Files are kept and read once one is there; tell who runs this installation. </>}
      {workerSeen === null && <><b>The queue does not answer.</b> Files are kept and read once it is back. </>}
    </span>
  );
}

function headline(taking: readonly Grid[], done: number): string {
  const unmapped = taking.filter((grid) => grid.state === 'needs-columns').length;
  if (unmapped > 0) return unmapped === 1 ? 'A file waits for its columns.' : `${formatCount(unmapped)} files wait for their columns.`;
  if (done === 0) return taking.length === 1 ? 'The one grid is not there yet.' : `None of the ${formatCount(taking.length)} grids is there yet.`;
  return `${formatCount(done)} of ${formatCount(taking.length)} grids ${done === 1 ? 'is' : 'are'} there.`;
}

function WhatIsNeeded({ taking }: { taking: readonly Grid[] }) {
  const labelsOf = (state: Grid['state']) => taking.filter((grid) => grid.state === state).map(({ label }) => label).reverse();
  const [rejected, unmapped] = [labelsOf('rejected'), labelsOf('needs-columns')];
  return (
    <>
      {rejected.length > 0 && `The ${rejected.length === 1 ? 'file' : 'files'} of ${joinWords(rejected)} ${rejected.length === 1 ? 'was' : 'were'} rejected: replace ${rejected.length === 1 ? 'it' : 'them'}, or leave the grid out. `}
      {unmapped.length > 0 && <>The columns must be chosen once for this case: <TextLink href="#columns">choose columns</TextLink>. </>}
      The outcome comes by itself once every grid is there or left out with a reason.
    </>
  );
}
