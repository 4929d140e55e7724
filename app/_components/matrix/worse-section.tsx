import type { Matrix } from '@/lib/domain/matrix/schema';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { formatRatio } from '@/lib/domain/numbers/format-ratio';
import { norms } from '@/lib/numerics/assessment';
import { spacingLabel } from '@/lib/figures/spacing-label';
import { ErrorText } from '../figures/error-text';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { Section } from '../ui/section';
import { NormSymbol, Sym } from '../ui/symbols';
import { NameLink } from '../ui/text-link';

function Order({ value }: { value: number | null }) {
  return value === null ? <Missing reason="No order" /> : <>{formatOrder(value)}</>;
}

function Series({ field, norm }: { field: string; norm: string }) {
  const known = norms.find((each) => each === norm);
  if (known === undefined) return <>{field}</>;
  return <><Sym>{field}</Sym>, <NormSymbol norm={known} /></>;
}

/** What got worse from the release before the newest to the newest, in order and in error at equal spacing. */
export function WorseSection({ matrix, slug }: { matrix: Matrix; slug: string }) {
  const [before, after] = matrix.releases.slice(-2);
  if (!before || !after) return null;
  return (
    <Section heading={`Worse since ${before.version}`} note={<p>Last order, and error on the finest grid that both releases ran.</p>}>
      {matrix.worse.length === 0
        ? <p className="text-graphite">Nothing that both releases ran got worse in {after.version}.</p>
        : (
          <Table caption={`What got worse from ${before.version} to ${after.version}.`} hideCaption>
            <Head>
              <tr>
                <HeadCell rowSpan={2}>Case</HeadCell><HeadCell rowSpan={2}>Field, norm</HeadCell><HeadCell rowSpan={2} num><Sym>h</Sym></HeadCell>
                <HeadCell ofGroup colSpan={2}>Last order</HeadCell><HeadCell ofGroup colSpan={2}>Error</HeadCell><HeadCell rowSpan={2} num>Ratio</HeadCell>
              </tr>
              <tr><HeadCell num>{before.version}</HeadCell><HeadCell num>{after.version}</HeadCell><HeadCell num>{before.version}</HeadCell><HeadCell num>{after.version}</HeadCell></tr>
            </Head>
            <tbody>
              {matrix.worse.map((entry) => (
                <Row key={`${entry.case} ${entry.field} ${entry.norm}`} isLinked>
                  <RowHead className="min-w-36"><NameLink href={`/${slug}/cases/${entry.case}`}>{entry.caseName}</NameLink></RowHead>
                  <Cell className="whitespace-nowrap"><Series field={entry.field} norm={entry.norm} /></Cell>
                  <Cell num>{spacingLabel(entry.h)}</Cell>
                  <Cell num><Order value={entry.orderBefore} /></Cell>
                  <Cell num><b><Order value={entry.orderAfter} /></b></Cell>
                  <Cell num><ErrorText value={entry.errorBefore} /></Cell>
                  <Cell num><ErrorText value={entry.errorAfter} /></Cell>
                  <Cell num>×{formatRatio(entry.ratio)}</Cell>
                </Row>
              ))}
            </tbody>
          </Table>
        )}
    </Section>
  );
}
