'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import { getStorageContract, type StorageUse } from '@/lib/domain/storage/schema';
import { deleteUploadContract } from '@/lib/domain/uploads/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { problemOf } from '../api/problem-of';
import { ProblemNotice } from '../forms/problem-notice';
import { useOrganisation } from '../organisation/organisation-context';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { DateTime } from '../ui/date-time';
import { NameLink, TextButton } from '../ui/text-link';

type OpenUpload = StorageUse['uploads'][number];

/** Uploads that are open, by anybody; giving one up frees its room and gives the grid the file it had. */
export function OpenUploads({ uploads }: { uploads: readonly OpenUpload[] }) {
  const { slug, may } = useOrganisation();
  const queries = useQueryClient();
  const giveUp = useMutation({
    mutationFn: ({ id }: OpenUpload) => callApi(deleteUploadContract, { organisation: slug, params: { id } }),
    onSettled: () => queries.invalidateQueries({ queryKey: apiKey(getStorageContract) }),
  });
  return (
    <>
      <Table caption="Uploads in progress, the oldest first." hideCaption>
        <Head>
          <tr>
            <HeadCell>File, grid</HeadCell><HeadCell num>Size</HeadCell><HeadCell afterNumber className="max-tablet:hidden">By</HeadCell><HeadCell className="max-tablet:hidden">Since</HeadCell><HeadCell className="max-tablet:hidden">Last heard of</HeadCell>
            {may('work.write') && <HeadCell><span className="sr-only">Give up</span></HeadCell>}
          </tr>
        </Head>
        <tbody>
          {uploads.map((upload) => (
            <Row key={upload.id}>
              <RowHead className="[overflow-wrap:anywhere]">
                <NameLink href={`/${slug}/studies/${upload.study}`}>{upload.filename}</NameLink>, {upload.grid}
                <span className="block text-note text-graphite tablet:hidden">{upload.createdBy}, since <DateTime value={upload.createdAt} show="both" />, last heard of <DateTime value={upload.lastActivityAt} show="both" /></span>
              </RowHead>
              <Cell num>{formatBytes(upload.bytes)}</Cell>
              <Cell afterNumber className="break-all max-tablet:hidden">{upload.createdBy}</Cell>
              <Cell className="max-tablet:hidden"><DateTime value={upload.createdAt} show="both" /></Cell>
              <Cell className="max-tablet:hidden"><DateTime value={upload.lastActivityAt} show="both" /></Cell>
              {may('work.write') && (
                <Cell><TextButton className="whitespace-nowrap max-tablet:min-h-11" aria-label={`Give up ${upload.filename}, grid ${upload.grid}`} disabled={giveUp.isPending} onClick={() => giveUp.mutate(upload)}>Give up</TextButton></Cell>
              )}
            </Row>
          ))}
        </tbody>
      </Table>
      <ProblemNotice problem={problemOf(giveUp.error, 'Not given up')} />
    </>
  );
}
