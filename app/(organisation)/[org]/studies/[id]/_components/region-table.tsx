import { Fragment } from 'react';
import { ErrorText } from '@/app/_components/figures/error-text';
import { Cell, HeadCell, Missing, ReasonRow, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import { lastOrder, lowerAtBoundary, regionRows, type RegionPair, type RegionRow } from '@/lib/domain/assessment/region-parts';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import type { FieldAssessment } from '@/lib/numerics/assessment';

interface RegionTableProps { fields: readonly FieldAssessment[]; thickness: number | undefined; number: number }

function BandWords({ band, thickness, isInside }: { band: RegionPair['band']; thickness: number | undefined; isInside: boolean }) {
  if (band === 'fixed' && thickness === undefined) return isInside ? 'rows inside' : 'flagged rows';
  return <>{isInside ? 'beyond' : 'within'} {band === '2h' ? <>2<Sym>h</Sym></> : Number(thickness?.toPrecision(4))} of the boundary</>;
}

/** The same norms inside and near the boundary. They have no outcome: they tell where an order is lost. */
export function RegionTable({ fields, thickness, number }: RegionTableProps) {
  const rows = regionRows(fields);
  const bands = (['2h', 'fixed'] as const).filter((band) => rows.some(({ pairs }) => pairs.some((pair) => pair.band === band)));
  const columns = 2 + bands.length * 4;
  return (
    <Table number={number} caption="Interior and boundary, judged by no outcome: the order of the last pair of grids, and the error on the finest.">
      <Head>
        <tr>
          <HeadCell rowSpan={2}>Field</HeadCell><HeadCell rowSpan={2}>Norm</HeadCell>
          {bands.flatMap((band) => [true, false].map((isInside) => (
            <HeadCell key={`${band} ${isInside}`} ofGroup colSpan={2}><BandWords band={band} thickness={thickness} isInside={isInside} /></HeadCell>
          )))}
        </tr>
        <tr>{bands.flatMap((band) => [0, 1].flatMap((part) => [<HeadCell key={`${band} ${part} order`} num>Order</HeadCell>, <HeadCell key={`${band} ${part} error`} num>Error</HeadCell>]))}</tr>
      </Head>
      <tbody>
        {rows.map((row, index) => {
          const isFirst = rows[index - 1]?.whole.field !== row.whole.field;
          return (
            <Fragment key={`${row.whole.field} ${row.whole.norm}`}>
              <Row startsGroup={index > 0 && isFirst}>
                {isFirst ? <RowHead><Sym>{row.whole.field}</Sym></RowHead> : <Cell><span className="sr-only">{row.whole.field}</span></Cell>}
                <Cell><NormSymbol norm={row.whole.norm} /></Cell>
                {bands.flatMap((band) => {
                  const pair = row.pairs.find((each) => each.band === band);
                  return [pair?.interior, pair?.boundary].map((part, at) => <PartCells key={`${band} ${at}`} part={part} />);
                })}
              </Row>
              {bands.map((band) => <LowerRow key={band} row={row} band={band} thickness={thickness} columns={columns} />)}
            </Fragment>
          );
        })}
      </tbody>
    </Table>
  );
}

function PartCells({ part }: { part: FieldAssessment | undefined }) {
  const order = part ? lastOrder(part) : null;
  const finest = part?.grids[0];
  return (
    <>
      <Cell num>{order === null ? <Missing reason="No order for the last pair" /> : formatOrder(order)}</Cell>
      <Cell num>{finest === undefined ? <Missing reason="No rows in this part" /> : <ErrorText value={finest.error} />}</Cell>
    </>
  );
}

function LowerRow({ row, band, thickness, columns }: { row: RegionRow; band: RegionPair['band']; thickness: number | undefined; columns: number }) {
  const pair = row.pairs.find((each) => each.band === band);
  const lower = pair ? lowerAtBoundary(row.whole, pair) : null;
  if (lower === null) return null;
  return (
    <ReasonRow before={1} columns={columns}>
      Lower at the boundary: order {formatOrder(lower.boundary)}{' '}
      {band === '2h' ? <>within 2<Sym>h</Sym> of it</> : thickness === undefined ? 'in flagged rows' : `within ${Number(thickness.toPrecision(4))} of it`}, {formatOrder(lower.interior)} inside.
      {' '}Look at the stencil, the condition or the interpolation there.
    </ReasonRow>
  );
}
