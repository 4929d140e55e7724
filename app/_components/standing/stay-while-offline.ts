'use client';

import { useEffect, useState } from 'react';

const isPlainClick = (event: MouseEvent) => event.button === 0 && !event.metaKey && !event.ctrlKey && !event.shiftKey && !event.altKey;

/**
 * Keeps the page, and what is typed on it, where a link would lead to one that cannot be loaded. True once a link was
 * pressed in vain.
 */
export function useStayWhileOffline(isOffline: boolean): boolean {
  const [wasStopped, setWasStopped] = useState(false);
  useEffect(() => {
    if (!isOffline) return;
    const stop = (event: MouseEvent) => {
      const link = event.target instanceof Element ? event.target.closest('a') : null;
      if (!link || !isPlainClick(event) || link.target !== '' || link.hasAttribute('download')) return;
      const to = new URL(link.href, window.location.href);
      if (to.pathname === window.location.pathname && to.hash !== '') return;
      event.preventDefault();
      event.stopPropagation();
      setWasStopped(true);
    };
    window.addEventListener('click', stop, { capture: true });
    return () => {
      window.removeEventListener('click', stop, { capture: true });
      setWasStopped(false);
    };
  }, [isOffline]);
  return wasStopped;
}
