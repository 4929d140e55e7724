import type { Metadata } from 'next';
import { PublicPage } from '@/app/_components/public/public-page';
import { Cell, HeadCell } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { PageTitle } from '@/app/_components/ui/page-title';
import { findHome } from '@/app/_server/visit';
import { Section } from '@/app/_components/ui/section';
import { errorTable, type ErrorCode } from '@/lib/errors';

export const metadata: Metadata = { title: 'Answers that refuse' };

const wayOn: Record<ErrorCode, string> = {
  'bad-request': 'Send JSON, and headers and query members in the form the API document gives.',
  'organisation-needed': 'You belong to several organisations: add ?organisation= with the short name of one.',
  'not-signed-in': 'Sign in, or send a token that has neither ended nor been withdrawn.',
  'wrong-credentials': 'Type e-mail and password again.',
  'not-allowed': 'Your roles, or the token, do not carry this. The answer names what is needed.',
  'foreign-origin': 'Write from a page of this site; scripts use a token instead of a cookie.',
  'not-found': 'Check the address. What belongs to others is answered the same way.',
  'too-slow': 'Send it again over a better line; large files go in parts, straight to storage.',
  'wrong-state': 'Read the study again: its state says what is possible now.',
  'already-exists': 'Choose another name, or use the one that is there.',
  'request-in-flight': 'Wait for the first answer; the same key then gives it again.',
  'stale-revision': 'Read it again, look at what changed, and send the change with the new revision.',
  'too-large': 'Send a file in parts, a long list in several calls.',
  'no-room': 'Give up uploads in progress under Storage, or have the quota raised; nothing was kept.',
  invalid: 'Mend the members named under errors; nothing was changed.',
  'wrong-password': 'Type the present password again.',
  'not-available': 'Leave out the member named under errors.',
  'key-reused': 'Use a new key for a request with another body.',
  'revision-needed': 'Send If-Match with the revision you read.',
  'too-many-requests': 'Wait for the seconds in Retry-After.',
  unexpected: 'Try again; if it stays, report the number in the answer.',
  unavailable: 'Try again in a moment; nothing was changed.',
};

export default async function ProblemsPage() {
  return (
    <PublicPage title="Answers that refuse" home={await findHome()}>
      <Section note={<p>Every refusal is a problem document (RFC 9457): type, title, status, detail, and under errors the path and fault of each member concerned.</p>}>
        <PageTitle under="What the API says when it cannot do what was asked, and the way on.">Answers that refuse</PageTitle>
        <div className="mt-6">
          <Table caption="Every kind of refusal, by its type." hideCaption>
            <Head><tr><HeadCell num>Status</HeadCell><HeadCell afterNumber>Answer, and the way on</HeadCell></tr></Head>
            <tbody>
              {(Object.keys(errorTable) as ErrorCode[]).map((code) => (
                <Row key={code} id={code} className="target:bg-wash">
                  <Cell num>{errorTable[code].status}</Cell>
                  <Cell afterNumber>
                    <b>{errorTable[code].title}</b> <code className="ml-2 font-mono text-code text-graphite">{code}</code>
                    <span className="block">{wayOn[code]}</span>
                  </Cell>
                </Row>
              ))}
            </tbody>
          </Table>
        </div>
      </Section>
    </PublicPage>
  );
}
