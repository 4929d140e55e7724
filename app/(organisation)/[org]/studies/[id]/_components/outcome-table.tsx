import { Fragment } from 'react';
import { markOfOutcome } from '@/app/_components/studies/mark-of-outcome';
import { Cell, HeadCell, Missing, ReasonRow, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { OutcomeWord } from '@/app/_components/ui/outcome-word';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import { explainOrderSource } from '@/lib/domain/assessment/explain-order-source';
import { explainField } from '@/lib/domain/assessment/reason-text';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import { formatRatio } from '@/lib/domain/numbers/format-ratio';
import type { Study } from '@/lib/domain/studies/schema';
import { figureFields } from '@/lib/figures/error-figure/figure-fields';
import type { FieldAssessment } from '@/lib/numerics/assessment';
import { symbolsOf } from './symbols-of';

interface Pair { coarse: string; fine: string; h: number }
interface OutcomeTableProps { study: Study; fields: readonly FieldAssessment[]; number: number }

const columnsBeforePairs = 6;

/** Every pair of grids that some norm has an order for, coarse to fine. */
function pairsOf(fields: readonly FieldAssessment[]): Pair[] {
  const pairs = new Map<string, Pair>();
  for (const { grids, orders } of fields) {
    for (const { coarse, fine } of orders) {
      const h = grids.find((grid) => grid.label === fine)?.h ?? 0;
      pairs.set(`${coarse} ${fine}`, { coarse, fine, h });
    }
  }
  return [...pairs.values()].sort((a, b) => b.h - a.h);
}

/** 1/h of a grid where it is a whole number. */
function wholeInverse(fields: readonly FieldAssessment[], label: string): number | null {
  const h = fields.flatMap(({ grids }) => grids).find((grid) => grid.label === label)?.h ?? 0;
  const inverse = Math.round(1 / h);
  return inverse >= 2 && Math.abs(inverse * h - 1) < 1e-9 ? inverse : null;
}

const isPlainPass = ({ outcome, reasons }: FieldAssessment) => outcome === null || (outcome === 'pass' && reasons.every((reason) => reason === 'in-band'));

function lastRatio({ grids, orders }: FieldAssessment): string | null {
  const errorOn = (label: string | undefined) => grids.find((grid) => grid.label === label)?.error;
  const [coarse, fine] = [errorOn(orders[0]?.coarse), errorOn(orders[0]?.fine)];
  return coarse && fine ? formatRatio(coarse / fine) : null;
}

/** What each field and norm came to: outcome first, then what it is judged by and every observed order. */
export function OutcomeTable({ study, fields, number }: OutcomeTableProps) {
  const pairs = pairsOf(fields);
  const areWhole = pairs.every(({ coarse, fine }) => wholeInverse(fields, coarse) !== null && wholeInverse(fields, fine) !== null);
  const pairName = ({ coarse, fine }: Pair) => (areWhole ? `${wholeInverse(fields, coarse)}, ${wholeInverse(fields, fine)}` : `${coarse}, ${fine}`);
  const columns = columnsBeforePairs + pairs.length + 1;
  const symbols = symbolsOf(study);
  return (
    <Table number={number} caption="Outcome, and the observed order of each pair of grids, coarse to fine.">
      <Head>
        <tr>
          <HeadCell rowSpan={2}>Field</HeadCell><HeadCell rowSpan={2}>Norm</HeadCell><HeadCell rowSpan={2}>Outcome</HeadCell>
          <HeadCell rowSpan={2}>Counts</HeadCell><HeadCell rowSpan={2} num>Formal</HeadCell><HeadCell rowSpan={2} num>Band</HeadCell>
          {pairs.length > 0 && <HeadCell ofGroup colSpan={pairs.length} className="whitespace-nowrap">{areWhole ? <>Observed between 1/<Sym>h</Sym> of</> : 'Observed between grids'}</HeadCell>}
          <HeadCell rowSpan={2} num className="w-16">Last ratio</HeadCell>
        </tr>
        <tr>{pairs.map((pair) => <HeadCell key={pairName(pair)} num className="whitespace-nowrap">{pairName(pair)}</HeadCell>)}</tr>
      </Head>
      <tbody>
        {figureFields(fields).flatMap(({ field, norms }, group) => norms.map((part, index) => (
          <Fragment key={`${field} ${part.norm}`}>
            <Row startsGroup={group > 0 && index === 0}>
              {index === 0 ? <RowHead>{part.norm === 'value' ? field : <Sym>{field}</Sym>}</RowHead> : <Cell><span className="sr-only">{field}</span></Cell>}
              <Cell><NormSymbol norm={part.norm} /></Cell>
              <OutcomeCells part={part} study={study} pairs={pairs} />
            </Row>
            {explainOrderSource(part).length > 0 && <ReasonRow before={1} columns={columns}><FormulaText text={explainOrderSource(part).join(' ')} symbols={['h', 'L']} /></ReasonRow>}
            {!isPlainPass(part) && (
              <ReasonRow before={1} columns={columns}>
                {explainField(part).map(({ sentence, nextStep }) => (
                  <span key={sentence}><FormulaText text={sentence} symbols={symbols} /> {part.outcome !== 'pass' && <FormulaText text={nextStep} symbols={symbols} />} </span>
                ))}
              </ReasonRow>
            )}
          </Fragment>
        )))}
      </tbody>
    </Table>
  );
}

function OutcomeCells({ part, study, pairs }: { part: FieldAssessment; study: Study; pairs: readonly Pair[] }) {
  const formal = part.derivedOrder ?? part.formalOrder;
  const limits = formal === null || part.tolerance === null ? [] : [formal - part.tolerance, formal + 2 * part.tolerance];
  const [low = -Infinity, high = Infinity] = limits;
  const mark = markOfOutcome(part.outcome, { kind: study.case.kind, reasons: part.reasons });
  const declared = study.definition.fields.find(({ field }) => field === part.field)?.norms.find(({ norm }) => norm === part.norm);
  const ratio = lastRatio(part);
  const isAfterData = part.grids.some((grid) => grid.used && study.grids.some(({ label, afterData }) => afterData && label === grid.label));
  return (
    <>
      <Cell className="whitespace-nowrap">
        {mark === null ? <Missing reason="Not judged: no formal order" /> : <OutcomeWord mark={mark} />}
        {isAfterData && <i className="ml-1 text-note text-graphite">after data</i>}
      </Cell>
      <Cell>{part.counts ? 'yes' : <span className="text-graphite">no</span>}</Cell>
      <Cell num>{declared?.expectExact ? 'exact' : formal === null ? <Missing reason="No formal order" /> : Number(formal.toPrecision(4))}</Cell>
      <Cell num>{limits.length === 2 && !declared?.expectExact ? `${formatOrder(low)} to ${formatOrder(high)}` : <Missing reason="No band" />}</Cell>
      {pairs.map(({ coarse, fine }) => {
        const order = part.orders.find((each) => each.coarse === coarse && each.fine === fine)?.order ?? null;
        return (
          <Cell key={`${coarse} ${fine}`} num className={order !== null && (order < low || order > high) ? 'text-graphite' : ''}>
            {order === null ? <Missing reason="No order for this pair" /> : formatOrder(order, limits)}
          </Cell>
        );
      })}
      <Cell num>{ratio ?? <Missing reason="No pair of grids" />}</Cell>
    </>
  );
}
