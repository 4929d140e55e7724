'use client';

import { useState, useSyncExternalStore } from 'react';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { uploaderOf, type Transfer, type Uploader } from './uploader';

const nothing: ReadonlyMap<string, Transfer> = new Map();
const nothingToWatch = () => () => undefined;

/** The uploads of a study from this window, by grid; null on the server, where no file can be sent. */
export function useUploads(study: string): { uploader: Uploader | null; transfers: ReadonlyMap<string, Transfer> } {
  const { slug } = useOrganisation();
  const [uploader] = useState(() => (typeof window === 'undefined' ? null : uploaderOf(slug, study)));
  const transfers = useSyncExternalStore(uploader?.subscribe ?? nothingToWatch, uploader?.transfers ?? (() => nothing), () => nothing);
  return { uploader, transfers };
}
