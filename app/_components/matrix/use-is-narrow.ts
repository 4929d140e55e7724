'use client';

import { useSyncExternalStore } from 'react';

const query = '(max-width: 699.98px)';

function watch(onChange: () => void): () => void {
  const media = window.matchMedia(query);
  media.addEventListener('change', onChange);
  return () => media.removeEventListener('change', onChange);
}

/** Whether the page is a phone's; the server takes it for a wide one. */
export function useIsNarrow(): boolean {
  return useSyncExternalStore(watch, () => window.matchMedia(query).matches, () => false);
}
