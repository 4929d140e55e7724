'use client';

import { useEffect } from 'react';
import { meContract } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import { useOrganisation } from '../organisation/organisation-context';
import { accessLoss, lossOf } from './access-loss';
import { doubts } from './access-watch';

/** Asks who is signed in, and with which roles, whenever something was refused as not allowed or not there, or a stream ended. */
export function WatchAccess() {
  const { userId, id, roles } = useOrganisation();
  useEffect(() => {
    accessLoss.set(null);
    const ask = () => {
      callApi(meContract, {}).then(
        (me) => accessLoss.set(lossOf({ userId, organisation: { id, roles } }, me)),
        // Not told is not lost: the refusal itself is shown where it was met.
        () => undefined,
      );
    };
    return doubts.subscribe(ask);
  }, [userId, id, roles]);
  return null;
}
