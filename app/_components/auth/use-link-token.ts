'use client';

import { useEffect, useState } from 'react';

/** The secret of the link that led here, taken out of the address so that it is neither copied nor kept in the history. */
export function useLinkToken(given: string | null): string | null {
  const [token] = useState(given);
  useEffect(() => {
    if (token !== null) window.history.replaceState(window.history.state, '', window.location.pathname);
  }, [token]);
  return token;
}
