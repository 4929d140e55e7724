'use client';

import { useEffect, useState, useSyncExternalStore } from 'react';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import type { Study } from '@/lib/domain/studies/schema';
import type { Transfer } from './transfer';
import { uploaderOf, type Uploader } from './uploader';

const nothing: ReadonlyMap<string, Transfer> = new Map();
const nothingToWatch = () => () => undefined;

/** The uploads of a study from this browser, by grid; null on the server, where no file can be sent. */
export function useUploads({ id, grids }: Pick<Study, 'id' | 'grids'>): { uploader: Uploader | null; transfers: ReadonlyMap<string, Transfer> } {
  const { slug } = useOrganisation();
  const [uploader] = useState(() => (typeof window === 'undefined' ? null : uploaderOf(slug, id)));
  const transfers = useSyncExternalStore(uploader?.subscribe ?? nothingToWatch, uploader?.transfers ?? (() => nothing), () => nothing);
  useEffect(() => uploader?.heed(grids), [uploader, grids]);
  return { uploader, transfers };
}
