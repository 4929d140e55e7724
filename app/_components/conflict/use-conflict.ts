'use client';

import { useQuery } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import type { Submit } from '../api/use-submit';

interface Revised { revision: number; changedAt: string; changedBy: string }

/** One thing of a form in words. */
export interface ConflictRow { name: string; text: string }
export interface ConflictDifference { name: string; theirs: string; mine: string }

export interface Conflict {
  present: Revised; began: number;
  differences: readonly ConflictDifference[];
  keepMine: () => void;
  takeTheirs: () => void;
}

interface ConflictOptions<Present extends Revised> {
  submit: Submit;
  /** The revision that the form began from. */
  base: Present;
  onMoved: (present: Present) => void;
  readPresent: () => Promise<Present>;
  takeTheirs: (present: Present) => void;
  rowsOf: (side: 'mine' | Present) => readonly ConflictRow[];
}

function differencesOf(theirs: readonly ConflictRow[], mine: readonly ConflictRow[]): ConflictDifference[] {
  const names = [...new Set([...theirs, ...mine].map(({ name }) => name))];
  const textIn = (rows: readonly ConflictRow[], name: string) => rows.find((row) => row.name === name)?.text ?? '';
  return names.map((name) => ({ name, theirs: textIn(theirs, name), mine: textIn(mine, name) })).filter(({ theirs: there, mine: here }) => there !== here);
}

/** Once a save was refused because somebody else had saved: what is there now beside what is typed, and both ways on. */
export function useConflict<Present extends Revised>({ submit, base, onMoved, readPresent, takeTheirs, rowsOf }: ConflictOptions<Present>): Conflict | null {
  const keptOver = useRef<number | null>(null);
  const { problem, onSubmit, clear } = submit;
  const isStale = problem?.status === 412;
  // Where it cannot be read the refusal itself is shown, and saving again asks again.
  const { data: present } = useQuery({ queryKey: ['present revision', problem], queryFn: readPresent, enabled: isStale, staleTime: 0, gcTime: 0 });

  // Sent once the form is one of the revision it is saved over.
  useEffect(() => {
    if (keptOver.current !== base.revision) return;
    keptOver.current = null;
    void onSubmit();
  }, [base.revision, onSubmit]);

  if (!isStale || present === undefined) return null;
  const leave = () => { onMoved(present); clear(); };
  return {
    present, began: base.revision, differences: differencesOf(rowsOf(present), rowsOf('mine')),
    keepMine: () => { keptOver.current = present.revision; leave(); },
    takeTheirs: () => { takeTheirs(present); leave(); },
  };
}
