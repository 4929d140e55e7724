'use client';

import { useApi } from '@/app/_components/api/use-api';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { DateTime } from '@/app/_components/ui/date-time';
import { ProgressBar } from '@/app/_components/ui/progress-bar';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import type { Grid } from '@/lib/domain/studies/schema';
import { getUploadContract } from '@/lib/domain/uploads/schema';
import { isLively } from './decide-send';
import { isRemembered } from './upload-memory';
import { WithBar } from './with-bar';

const lookEvery = 4000;

function useOpenUpload(id: string) {
  const { slug } = useOrganisation();
  return useApi(getUploadContract, { organisation: slug, params: { id } }, { refetchEvery: ({ state }) => (state === 'receiving' ? lookEvery : false) });
}

/** Whether somebody elsewhere sends it now, or it stopped half-way. */
export function OpenState({ upload: { id } }: { upload: NonNullable<Grid['upload']> }) {
  const { data, dataUpdatedAt } = useOpenUpload(id);
  return data && isLively(data, dataUpdatedAt) && !isRemembered(id) ? 'being sent' : 'half sent';
}

/** An upload that another window has open: whose it is, since when, how much is stored. */
export function OpenUpload({ grid, upload: { id, createdBy, createdAt } }: { grid: string; upload: NonNullable<Grid['upload']> }) {
  const { email } = useOrganisation();
  const { data, dataUpdatedAt } = useOpenUpload(id);
  if (data?.state !== 'receiving') return null;
  const stored = data.parts.reduce((sum, { bytes }) => sum + bytes, 0);
  const who = createdBy === email ? 'you' : createdBy;
  return (
    <WithBar>
      <ProgressBar label={`Stored of grid ${grid}`} share={data.bytes > 0 ? stored / data.bytes : 0} />
      <span className="text-note text-graphite [overflow-wrap:anywhere]">
        {formatBytes(stored)} of {formatBytes(data.bytes)} by {who}, since <DateTime value={createdAt} show="time" />.
        {!isLively(data, dataUpdatedAt) && ' Nothing was heard for a while: choose the same file to go on where it stopped.'}
        {isLively(data, dataUpdatedAt) && createdBy === email && ' Choose the same file to go on where it stopped.'}
      </span>
    </WithBar>
  );
}
