'use client';

import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import { formatCount } from '@/lib/domain/numbers/format-count';
import { getStorageContract, type StorageUse } from '@/lib/domain/storage/schema';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { EmptyState } from '../ui/empty-state';
import { PageTitle } from '../ui/page-title';
import { ProgressBar } from '../ui/progress-bar';
import { Section } from '../ui/section';
import { NameLink } from '../ui/text-link';
import { OpenUploads } from './open-uploads';

const lookEvery = 5000;

/** What the organisation stores, against what it may. */
export function StorageView() {
  const { slug, name } = useOrganisation();
  const use = useApi(getStorageContract, { organisation: slug }, { refetchEvery: ({ uploads }) => (uploads.length > 0 ? lookEvery : false) });
  return (
    <OrganisationPage place={[{ label: 'Storage' }]}>
      <Section note={<StorageNotes />}>
        <PageTitle under={`Files sent by ${name}.`}>Storage</PageTitle>
        <div className="mt-6"><Answered query={use}>{(answer) => <Used use={answer} />}</Answered></div>
      </Section>
      <Answered query={use}>{({ uploads }) => uploads.length > 0 && <Section heading="Uploads in progress"><OpenUploads uploads={uploads} /></Section>}</Answered>
      <Section heading="Studies"><Answered query={use}>{({ studies }) => <Studies studies={studies} />}</Answered></Section>
    </OrganisationPage>
  );
}

function StorageNotes() {
  return (
    <>
      <p><b>What counts:</b> every whole file, and what uploads in progress have announced. What is given up stops counting at once.</p>
      <p>A file that was replaced counts for a day more, then it is removed. Files that a revision of a study was assessed from stay.</p>
      <p>An upload of which nothing is heard for a day is given up by itself.</p>
    </>
  );
}

function Used({ use: { used, quota, announced } }: { use: StorageUse }) {
  const left = Math.max(0, quota - used);
  return (
    <>
      <p className="text-lead"><b>{formatBytes(used)}</b> of {formatBytes(quota)}</p>
      <div className="mt-2 max-w-96"><ProgressBar label="Share of the quota in use" share={quota > 0 ? used / quota : 1} /></div>
      <p className="mt-2 text-note text-graphite">
        {left === 0 ? <b className="text-fail-text">No room is left: nothing more can be sent.</b> : `${formatBytes(left)} are left.`}
        {announced > 0 && ` Of what is used, ${formatBytes(announced)} are announced by uploads in progress.`}
      </p>
    </>
  );
}

function Studies({ studies }: { studies: StorageUse['studies'] }) {
  const { slug } = useOrganisation();
  if (studies.length === 0) return <EmptyState>The studies whose grids have files belong here, the largest first.</EmptyState>;
  return (
    <Table caption="Studies with files, the largest first." hideCaption>
      <Head><tr><HeadCell>Study</HeadCell><HeadCell>Code, release</HeadCell><HeadCell num>Files</HeadCell><HeadCell num>Size</HeadCell></tr></Head>
      <tbody>
        {studies.map(({ id, case: caseName, code, release, files, bytes }) => (
          <Row key={id}>
            <RowHead><NameLink href={`/${slug}/studies/${id}`}>{caseName}</NameLink></RowHead>
            <Cell>{code} {release}</Cell>
            <Cell num>{formatCount(files)}</Cell>
            <Cell num>{formatBytes(bytes)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
