import { Cell, HeadCell } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';

const alerts = [
  { when: 'fourfold_outbox_oldest_seconds > 300', means: 'Work waits: no worker runs, all are busy, or the store does not answer.' },
  { when: 'fourfold_outbox_jobs{state="failed"} > 0', means: 'A job has failed five times. It is tried again every five minutes; the log says why.' },
  { when: 'rate(fourfold_errors_total{code="unexpected"}[5m]) > 0', means: 'A fault of the product. The log has it under the id of the request.' },
  { when: 'rate(fourfold_errors_total{code="unavailable"}[5m]) > 0', means: 'Database, Redis or store does not answer.' },
  { when: 'fourfold_mails{state="sending"} > 0 for 5 minutes', means: 'A mail may or may not have gone out. Its owner can send it again.' },
  { when: 'fourfold_mails{state="failed"} grows', means: 'The mail server refuses.' },
  { when: 'fourfold_database_connections{state="waiting"} > 0 for a minute', means: 'More is asked at once than the database answers.' },
  { when: '/api/v1/ready is not 200', means: 'Its answer names what cannot be reached.' },
  { when: 'the newest manifest.json is older than a day', means: 'The backup has not run to its end.' },
];

/** What is worth waking somebody for, and what it means. */
export function AlertTable() {
  return (
    <Table number={3} caption="What to be told of.">
      <Head><tr><HeadCell>When</HeadCell><HeadCell>It means</HeadCell></tr></Head>
      <tbody>
        {alerts.map(({ when, means }) => (
          <Row key={when}>
            <Cell><code className="font-mono text-code [overflow-wrap:anywhere]">{when}</code></Cell>
            <Cell>{means}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
