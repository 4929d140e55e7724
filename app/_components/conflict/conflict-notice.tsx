'use client';

import { useCallback } from 'react';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { Button } from '../ui/button';
import { DateTime } from '../ui/date-time';
import { Notice } from '../ui/notice';
import type { Conflict, ConflictDifference } from './use-conflict';

interface ConflictNoticeProps { what: string; conflict: Conflict }

const orNothing = (text: string) => (text === '' ? <span className="text-graphite">nothing</span> : text);

/** Somebody else saved meanwhile: who, when, what differs, and whose is to hold. */
export function ConflictNotice({ what, conflict: { present, began, differences, keepMine, takeTheirs } }: ConflictNoticeProps) {
  const isSame = differences.length === 0;
  const actions = isSame
    ? <Button onClick={takeTheirs}>Go on from revision {present.revision}</Button>
    : <><Button onClick={keepMine}>Keep mine as revision {present.revision + 1}</Button><Button onClick={takeTheirs}>Take theirs</Button></>;
  // It takes the place of the button that was pressed, which then lies below the window.
  const show = useCallback((notice: HTMLElement | null) => notice?.scrollIntoView({ block: 'nearest' }), []);
  return (
    <div ref={show} className="mt-4 scroll-my-6">
      <Notice title="Not saved." actions={actions} below={isSame ? undefined : <Differences of={present.revision} differences={differences} />}>
        {present.changedBy} saved revision {present.revision} of this {what} on <DateTime value={present.changedAt} show="both" />; you began from revision {began}.
        {isSame ? ' It holds just what you typed.' : ' Yours is still in the form. Where the two differ:'}
      </Notice>
    </div>
  );
}

function Differences({ of, differences }: { of: number; differences: readonly ConflictDifference[] }) {
  return (
    <Table caption={`What differs between revision ${of} and yours.`} hideCaption>
      <Head><tr><HeadCell>What</HeadCell><HeadCell>Revision {of}</HeadCell><HeadCell>Yours</HeadCell></tr></Head>
      <tbody>
        {differences.map(({ name, theirs, mine }) => (
          <Row key={name}><RowHead>{name}</RowHead><Cell className="break-words whitespace-pre-line">{orNothing(theirs)}</Cell><Cell className="break-words whitespace-pre-line">{orNothing(mine)}</Cell></Row>
        ))}
      </tbody>
    </Table>
  );
}
