import type { z } from 'zod';
import { Cell, HeadCell, Missing, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { Hash } from '@/app/_components/ui/hash';
import { Section } from '@/app/_components/ui/section';
import type { runRecordSchema } from '@/lib/domain/studies/input';
import type { Grid } from '@/lib/domain/studies/schema';

type RunRecord = z.infer<typeof runRecordSchema>;
interface RunGroup { labels: string[]; run: RunRecord; times: number[] }

const precisions = { double: '64 bit', single: '32 bit' } as const;

/** Grids with the same record but for the time it took, coarse to fine. */
function groupRuns(grids: readonly Grid[]): RunGroup[] {
  const groups = new Map<string, RunGroup>();
  for (const { label, run = {} } of [...grids].reverse()) {
    const { wallTime, ...rest } = run;
    if (Object.keys(run).length === 0) continue;
    const key = JSON.stringify(Object.entries(rest).sort(([a], [b]) => a.localeCompare(b)));
    const group: RunGroup = groups.get(key) ?? { labels: [], run: rest, times: [] };
    group.labels.push(label);
    if (wallTime !== undefined) group.times.push(wallTime);
    groups.set(key, group);
  }
  return [...groups.values()];
}

/** How the solver was run, so that somebody can run it again. */
export function RunRecordSection({ grids, number }: { grids: readonly Grid[]; number: number }) {
  const groups = groupRuns(grids);
  if (groups.length === 0) return <Section heading="Run record"><p className="text-graphite">No compiler, platform or command was stated with the grids.</p></Section>;
  const isOne = groups.length === 1 && groups[0]?.labels.length === grids.length;
  const rows = [...new Set(groups.flatMap(({ run }) => (run.command ? [run.command] : [])))];
  return (
    <Section note={isOne && <p>The same on all grids unless shown.</p>}>
      <Table number={number} caption="Run record.">
        <Head>
          <tr>
            <HeadCell>Grids</HeadCell><HeadCell>Compiler and flags</HeadCell><HeadCell>Precision</HeadCell><HeadCell>Platform</HeadCell>
            <HeadCell num>Ranks</HeadCell><HeadCell afterNumber>Mesh tool</HeadCell><HeadCell>Input deck</HeadCell><HeadCell num>Wall time, s, coarse to fine</HeadCell>
          </tr>
        </Head>
        <tbody>
          {groups.map(({ labels, run, times }) => (
            <Row key={labels.join(' ')}>
              <RowHead>{isOne ? 'all' : labels.join(', ')}</RowHead>
              <Cell>{[run.compiler, run.flags].filter(Boolean).join(' ') || <Missing reason="Not stated" />}</Cell>
              <Cell>{run.precision ? precisions[run.precision] : <Missing reason="Not stated, read as 64 bit" />}</Cell>
              <Cell>{run.platform ?? <Missing reason="Not stated" />}</Cell>
              <Cell num>{run.ranks ?? <Missing reason="Not stated" />}</Cell>
              <Cell afterNumber>{run.meshTool ?? <Missing reason="Not stated" />}</Cell>
              <Cell>{run.inputDeckSha256 ? <Hash value={run.inputDeckSha256} /> : <Missing reason="Not stated" />}</Cell>
              <Cell num>{times.length > 0 ? times.join(', ') : <Missing reason="Not stated" />}</Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      {rows.map((command) => <p key={command} className="mt-2 text-note text-graphite">Command: <code className="font-mono text-code break-words text-ink">{command}</code></p>)}
    </Section>
  );
}
