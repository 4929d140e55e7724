import { ErrorText } from '@/app/_components/figures/error-text';
import { Cell, HeadCell, Missing, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import { formatMeasure } from '@/lib/domain/numbers/format-measure';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { formatPercent } from '@/lib/domain/numbers/format-percent';
import { formatValue } from '@/lib/domain/numbers/format-value';
import type { SpaceTimeAssessment } from '@/lib/numerics/assessment';
import { spacingLabel } from '@/lib/figures/spacing-label';

interface SpaceTimeTableProps { parts: readonly SpaceTimeAssessment[]; number: number }

const tooFew = 'Too few grids for a fit';

function Spread({ value, spread }: { value: number | null; spread: number | undefined }) {
  if (value === null) return <Missing reason={tooFew} />;
  return <FormulaText text={`${formatOrder(value)}${spread === undefined ? '' : ` ± ${formatMeasure(spread)}`}`} />;
}

function Size({ value }: { value: number | null }) {
  return value === null ? <Missing reason={tooFew} /> : <FormulaText text={formatValue(value, Math.abs(value) / 100)} />;
}

/** The orders in space and in time of each field and norm, from one fit over the matrix. */
export function SpaceTimeTable({ parts, number }: SpaceTimeTableProps) {
  return (
    <Table number={number} caption="Orders in space and in time, fitted over all grids and time steps together.">
      <Head>
        <tr>
          <HeadCell>Field</HeadCell><HeadCell>Norm</HeadCell><HeadCell num>Order in space <Sym>p</Sym></HeadCell><HeadCell num>Order in time <Sym>q</Sym></HeadCell>
          <HeadCell num><Sym>A</Sym></HeadCell><HeadCell num><Sym>B</Sym></HeadCell><HeadCell num><Sym>ρ</Sym></HeadCell><HeadCell num>Misfit</HeadCell>
        </tr>
      </Head>
      <tbody>
        {parts.map(({ field, norm, p, q, A, B, rho, residual, spread }) => (
          <Row key={`${field} ${norm}`}>
            <RowHead>{norm === 'value' ? field : <Sym>{field}</Sym>}</RowHead>
            <Cell><NormSymbol norm={norm} /></Cell>
            <Cell num><Spread value={p} spread={spread?.p} /></Cell>
            <Cell num><Spread value={q} spread={spread?.q} /></Cell>
            <Cell num><Size value={A} /></Cell>
            <Cell num><Size value={B} /></Cell>
            <Cell num>{rho === null ? <Missing reason={p === null ? tooFew : 'The error has a sign'} /> : formatOrder(rho)}</Cell>
            <Cell num>{residual === null ? <Missing reason={tooFew} /> : <FormulaText text={formatPercent(residual)} />}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

/** Which part of the error is the larger on every grid. */
export function SpaceTimeParts({ parts, number }: SpaceTimeTableProps) {
  const rows = parts.flatMap((part) => part.points.map((point, index) => ({ part, point, isFirst: index === 0 })));
  return (
    <Table number={number} caption="The error on every grid and the parts that spacing and time step have in it.">
      <Head>
        <tr>
          <HeadCell>Field</HeadCell><HeadCell>Norm</HeadCell><HeadCell>Grid</HeadCell><HeadCell num><Sym>h</Sym></HeadCell><HeadCell num><Sym>Δt</Sym></HeadCell>
          <HeadCell num>Error</HeadCell><HeadCell num>Of space</HeadCell><HeadCell num>Of time</HeadCell><HeadCell afterNumber>Larger part</HeadCell>
        </tr>
      </Head>
      <tbody>
        {rows.map(({ part, point: { label, h, dt, error, space, time }, isFirst }, index) => (
          <Row key={`${part.field} ${part.norm} ${label}`} startsGroup={isFirst && index > 0}>
            {isFirst ? <RowHead>{part.norm === 'value' ? part.field : <Sym>{part.field}</Sym>}</RowHead> : <Cell><span className="sr-only">{part.field}</span></Cell>}
            <Cell><NormSymbol norm={part.norm} /></Cell>
            <Cell className="whitespace-nowrap">{label}</Cell>
            <Cell num>{spacingLabel(h)}</Cell>
            <Cell num>{spacingLabel(dt)}</Cell>
            <Cell num><ErrorText value={error} /></Cell>
            <Cell num>{space === null ? <Missing reason={tooFew} /> : <ErrorText value={space} />}</Cell>
            <Cell num>{time === null ? <Missing reason={tooFew} /> : <ErrorText value={time} />}</Cell>
            <Cell afterNumber>{space === null || time === null ? <Missing reason={tooFew} /> : Math.abs(space) >= Math.abs(time) ? 'space' : 'time'}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
