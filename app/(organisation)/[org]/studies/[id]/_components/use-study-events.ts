'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { apiKey } from '@/app/_components/api/api-key';
import { apiAddress } from '@/app/_components/api/call-api';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { askAccess } from '@/app/_components/standing/access-watch';
import { studyEventSchema, studySnapshotSchema } from '@/lib/domain/events/schema';
import { getEventsContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';
import { followStream } from './follow-stream';

export interface Reading { rowsRead: number; share: number | null }
type Readings = ReadonlyMap<string, Reading>;

/** States that change without the reader doing anything. */
const movesByItself = (study: Study | undefined) =>
  study !== undefined && study.revision === study.currentRevision && (study.state === 'collecting' || study.state === 'assessing');

/** Follows a study while it collects and is assessed: how far each file is read, and new answers as soon as there are any. */
export function useStudyEvents(study: Study | undefined): { readings: Readings; isInterrupted: boolean } {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const [readings, setReadings] = useState<Readings>(new Map());
  const [isInterrupted, setIsInterrupted] = useState(false);
  const id = study?.id;
  const isWatched = movesByItself(study);

  useEffect(() => {
    if (!isWatched || id === undefined) return;
    const readAgain = () => void queries.invalidateQueries({ queryKey: apiKey(getStudyContract, { organisation: slug, params: { id } }).slice(0, 3) });
    return followStream(apiAddress(getEventsContract, { organisation: slug, params: { id } }), {
      listen: (source) => {
        source.addEventListener('snapshot', (event: MessageEvent<string>) => {
          if (studySnapshotSchema.safeParse(JSON.parse(event.data)).success) readAgain();
        });
        source.addEventListener('state', readAgain);
        source.addEventListener('progress', (event: MessageEvent<string>) => {
          const told = studyEventSchema.safeParse(JSON.parse(event.data));
          if (!told.success || told.data.event !== 'progress') return;
          const { grid, rowsRead, bytesRead, bytes } = told.data;
          setReadings((before) => new Map(before).set(grid, { rowsRead, share: bytes > 0 ? bytesRead / bytes : null }));
        });
      },
      onInterrupted: setIsInterrupted,
      // The stream ends when roles change or the session is over; a reading call tells of the latter.
      onRefused: () => { askAccess(); readAgain(); },
      onBack: askAccess,
    });
  }, [id, isWatched, queries, slug]);

  return { readings, isInterrupted: isInterrupted && isWatched };
}
