import type { Metadata } from 'next';
import type { ReactNode } from 'react';
import { VariableTable } from '@/app/_components/docs/variable-table';
import { PublicPage } from '@/app/_components/public/public-page';
import { PageTitle } from '@/app/_components/ui/page-title';
import { Section } from '@/app/_components/ui/section';
import { findHome } from '@/app/_server/visit';
import { listVariables } from '@/lib/env';
import { AlertTable } from '@/app/_components/docs/alert-table';

export const metadata: Metadata = { title: 'In production' };

const prose = 'flex max-w-[46em] flex-col gap-3';
const Code = ({ children }: { children: string }) => <code className="font-mono text-code [overflow-wrap:anywhere]">{children}</code>;
const Commands = ({ children }: { children: string }) => (
  <pre className="overflow-x-auto border-l border-rule pl-4 font-mono text-code leading-6" role="group" tabIndex={0} aria-label="Commands">{children}</pre>
);
const Prose = ({ children }: { children: ReactNode }) => <div className={prose}>{children}</div>;

export default async function ProductionPage() {
  const variables = listVariables();
  return (
    <PublicPage title="In production" home={await findHome()}>
      <Section note={<p>More web and worker processes may be started at any time: nothing in the memory of one matters to another.</p>}>
        <PageTitle under="What it stands on, how it is set up, watched, saved and brought up to date.">In production</PageTitle>
        <p className="mt-4 max-w-[46em]">
          Fourfold is two programs, web and worker, on PostgreSQL 15, Redis 7, an S3-compatible store and a mail server.
          In the repository <Code>docker/compose.yaml</Code> runs all of it on one machine; <Code>docker/Dockerfile</Code> builds the images.
        </p>
      </Section>
      <Section heading="Sizes" note={<p>As measured on two processors after the demo. The memory of a reading does not grow with the file.</p>}>
        <Prose>
          <p>A web process takes about 250 MB, a worker that reads two files at once 200 to 270 MB. In compose.yaml they may take 1 GB and 2 GB, PostgreSQL 1 GB, Redis 512 MB.</p>
          <p>The images hold 72 MB of our own for web and 44 MB for a worker. The database keeps norms and outcomes, a few kilobytes a grid; files lie in the store in the size they were sent. The number of workers, and of the threads of each, decides how many files are read at once.</p>
          <p>HDF5, and columns of JSON and VTK beyond 32 MB, wait on the disk of the worker while they are read, in files without a name under <Code>TMPDIR</Code>: room for the largest of them, unpacked, for each thread. A folder that is held in memory would take it from there.</p>
        </Prose>
      </Section>
      <Section heading="Variables" note={<p>A variable that is missing or wrong stops the start and is named. Web and worker take the same ones.</p>}>
        <div className="flex flex-col gap-6">
          <VariableTable number={1} caption="What web and worker are told." variables={variables.filter(({ isForCommands }) => !isForCommands)} />
          <VariableTable number={2} caption="What only migrations, backups and restoring are told." variables={variables.filter(({ isForCommands }) => isForCommands)} />
        </div>
      </Section>
      <Section heading="TLS and proxies" note={<p>X-Forwarded-For from anywhere else is not believed: limits for one address cannot be passed by inventing others.</p>}>
        <Prose>
          <p>Web speaks HTTP and stands behind a proxy that holds the certificate. Set <Code>PUBLIC_URL</Code> to the https address: cookies are then marked Secure, and writes from pages of any other origin are refused.</p>
          <p>Name the proxy’s address in <Code>TRUSTED_PROXIES</Code>. It must pass bodies on as they come (no buffering, no limit on size), keep event streams open for an hour, and ask <Code>/api/v1/ready</Code> whether a process may get requests.</p>
        </Prose>
      </Section>
      <Section heading="The store" note={<p>Parts are sent by browsers straight to the store, to addresses signed for it alone.</p>}>
        <Prose>
          <p>Browsers reach it at <Code>STORAGE_PUBLIC_URL</Code>, by path and not by a name for each bucket. A proxy before it must hand on the Host header unchanged, since signatures cover it.</p>
          <p>Its rules for other origins must allow <Code>PUBLIC_URL</Code> to PUT, any request header, and must expose <Code>ETag</Code>. Let the store end uploads in parts that are older than two days.</p>
        </Prose>
      </Section>
      <Section heading="Backup and restoring" note={<p>A backup without manifest.json was interrupted, and is refused. Redis needs none: what waits there stands in the database too.</p>}>
        <Prose>
          <p>One command takes the database and every file of one moment, each with its SHA-256. Files that lie there already are not copied again, so it may run every night into the same folder; keep copies of that folder elsewhere.</p>
          <Commands>{'docker compose -f docker/compose.yaml --env-file docker/.env run --rm backup\n\n# without containers, with the variables of table 2\nnode commands/backup.mjs FOLDER\nnode commands/restore.mjs FOLDER'}</Commands>
          <p>Restoring wants a database that <Code>docker/postgres/roles.sql</Code> has just made and an empty bucket, and refuses anything else. It checks every hash before it writes, and names what is damaged.</p>
          <p>Do it as a drill twice a year: restore into a second database and bucket, start a web process on them, and compare a study you know.</p>
        </Prose>
      </Section>
      <Section heading="New versions" note={<p>The change of a version says where two cannot run side by side; then stop all processes first.</p>}>
        <Prose>
          <p>Take a backup. Run the migrations of the new version once, then replace processes one after the other: until then the old version works on the new tables.</p>
          <p>A web process that is sent SIGTERM answers <Code>/api/v1/ready</Code> with 503, takes no more connections after a second, finishes what is in flight within <Code>DRAIN_SECONDS</Code>, and tells event streams to come back. A worker finishes its jobs within seven seconds and leaves longer ones to the others. With two of each nothing is refused and nothing is lost.</p>
        </Prose>
      </Section>
      <Section heading="Watching" note={<p>Behind a proxy on the same machine set <b>METRICS_TOKEN</b>, so that nobody reads them through it.</p>}>
        <div className="flex flex-col gap-4">
          <Prose>
            <p>Web serves <Code>/api/v1/metrics</Code> and each worker <Code>/metrics</Code> at its own port, in the text format of Prometheus. Logs are lines of JSON on standard output, without passwords, tokens, cookies or addresses of parts. The answer’s <Code>x-request-id</Code> stands in the line of the request and in those of the jobs that followed from it.</p>
          </Prose>
          <AlertTable />
        </div>
      </Section>
      <Section heading="Limits">
        <Prose>
          <p>A file sent in parts may have 1000 parts; the size of a part grows with the file. JSON bodies end at 1 MiB. One worker reads as many files at once as it has threads, and one file is read by one worker.</p>
          <p>Redis must not evict and should write to disk: without it live updates stop and new jobs wait in the database until it is back.</p>
        </Prose>
      </Section>
    </PublicPage>
  );
}
