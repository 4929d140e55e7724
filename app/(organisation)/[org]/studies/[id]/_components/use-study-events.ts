'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { apiKey } from '@/app/_components/api/api-key';
import { apiAddress } from '@/app/_components/api/call-api';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { studyEventSchema, studySnapshotSchema } from '@/lib/domain/events/schema';
import { getEventsContract, getStudyContract, type Study } from '@/lib/domain/studies/schema';

export interface Reading { rowsRead: number; share: number | null }

/** States that change without the reader doing anything. */
const movesByItself = (study: Study | undefined) =>
  study !== undefined && study.revision === study.currentRevision && (study.state === 'collecting' || study.state === 'assessing');

/** Follows a study while it collects and is assessed: how far each file is read, and new answers as soon as there are any. */
export function useStudyEvents(study: Study | undefined): ReadonlyMap<string, Reading> {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const [readings, setReadings] = useState<ReadonlyMap<string, Reading>>(new Map());
  const id = study?.id;
  const isWatched = movesByItself(study);

  useEffect(() => {
    if (!isWatched || id === undefined) return;
    const readAgain = () => void queries.invalidateQueries({ queryKey: apiKey(getStudyContract, { organisation: slug, params: { id } }).slice(0, 3) });
    const source = new EventSource(apiAddress(getEventsContract, { organisation: slug, params: { id } }));
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
    return () => source.close();
  }, [id, isWatched, queries, slug]);

  return readings;
}
