import { Fragment } from 'react';
import { ErrorText } from '@/app/_components/figures/error-text';
import { Cell, HeadCell, Missing, ReasonRow, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { FormulaText } from '@/app/_components/ui/formula-text';
import { Hash } from '@/app/_components/ui/hash';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { formatCount } from '@/lib/domain/numbers/format-count';
import { formatValue } from '@/lib/domain/numbers/format-value';
import type { Grid, Study } from '@/lib/domain/studies/schema';
import { figureFields, type FigureField } from '@/lib/figures/error-figure/figure-fields';
import { spacingLabel } from '@/lib/figures/spacing-label';
import { cellCount } from '@/lib/domain/studies/cell-count';

interface GridTableProps { study: Study; assessment: Assessment; number: number }

/** The spacing a grid was judged with. */
function spacingOf({ fields, quantities, spaceTime = [] }: Assessment, label: string): number | null {
  const places = [...fields.flatMap(({ grids }) => grids), ...quantities.flatMap(({ values }) => values), ...spaceTime.flatMap(({ points }) => points)];
  return places.find((place) => place.label === label)?.h ?? null;
}

/** The grids from coarse to fine: how fine, what came out on them, and the file it came from. */
export function GridTable({ study, assessment, number }: GridTableProps) {
  const fields = figureFields(assessment.fields);
  const { quantities } = assessment;
  const hasCells = study.grids.some((grid) => cellCount(grid, study.dimension) !== null);
  const hasFiles = study.grids.some((grid) => grid.upload !== null);
  const hasSteps = study.refinement !== 'time' && study.grids.some((grid) => grid.dt !== undefined);
  const isGrouped = fields.length > 0;
  const heads = isGrouped ? 2 : 1;
  const columns = 2 + Number(hasCells) + Number(hasSteps) + fields.reduce((sum, { norms }) => sum + norms.length, 0) + quantities.length + Number(hasFiles);
  return (
    <Table number={number} caption={`Grids, coarse to fine, with ${isGrouped ? 'their errors' : quantities.length > 0 ? 'their values' : 'their spacings'}${hasFiles ? ' and the files they come from' : ''}.`}>
      <Head>
        <tr>
          <HeadCell rowSpan={heads}>Grid</HeadCell>
          {hasCells && <HeadCell rowSpan={heads} num>Cells</HeadCell>}
          <HeadCell rowSpan={heads} num><Sym>{study.refinement === 'time' ? 'Δt' : 'h'}</Sym></HeadCell>
          {hasSteps && <HeadCell rowSpan={heads} num><Sym>Δt</Sym></HeadCell>}
          {fields.map(({ field, norms }) => <HeadCell key={field} ofGroup colSpan={norms.length}>Error of {norms[0]?.norm === 'value' ? field : <Sym>{field}</Sym>}</HeadCell>)}
          {quantities.map(({ name, unit }) => <HeadCell key={name} rowSpan={heads} num>{name}{unit ? `, ${unit}` : ''}</HeadCell>)}
          {hasFiles && <HeadCell rowSpan={heads} afterNumber>File, SHA-256</HeadCell>}
        </tr>
        {isGrouped && <tr>{fields.flatMap(({ field, norms }) => norms.map(({ norm }) => <HeadCell key={`${field} ${norm}`} num><NormSymbol norm={norm} /></HeadCell>))}</tr>}
      </Head>
      <tbody>
        {[...study.grids].reverse().map((grid) => {
          const h = spacingOf(assessment, grid.label);
          const cells = cellCount(grid, study.dimension);
          const reason = whyUnused(grid, fields);
          return (
            <Fragment key={grid.label}>
              <Row className={grid.excluded === null ? '' : 'text-graphite'}>
                <RowHead className="whitespace-nowrap">{grid.label}{grid.afterData && <i className="ml-1 text-note text-graphite">after data</i>}</RowHead>
                {hasCells && <Cell num>{cells === null ? <Missing reason="Cells not stated" /> : formatCount(cells)}</Cell>}
                <Cell num>{h === null ? <Missing reason="Left out, no spacing judged" /> : spacingLabel(h)}</Cell>
                {hasSteps && <Cell num>{grid.dt === undefined ? <Missing reason="Time step not stated" /> : spacingLabel(grid.dt)}</Cell>}
                {fields.flatMap((field) => field.norms.map((part) => <ErrorCell key={`${field.field} ${part.norm}`} part={part} label={grid.label} />))}
                {quantities.map(({ name, values }) => {
                  const value = values.find(({ label }) => label === grid.label)?.value;
                  return <Cell key={name} num>{value === undefined ? <Missing reason="No value" /> : <FormulaText text={formatValue(value)} />}</Cell>;
                })}
                {hasFiles && <FileCell grid={grid} />}
              </Row>
              {reason && <ReasonRow before={1} columns={columns}>{reason}</ReasonRow>}
            </Fragment>
          );
        })}
      </tbody>
    </Table>
  );
}

function ErrorCell({ part, label }: { part: FigureField['norms'][number]; label: string }) {
  const grid = part.grids.find((each) => each.label === label);
  if (!grid) return <Cell num><Missing reason="No error on this grid" /></Cell>;
  return <Cell num className={grid.used ? '' : 'text-graphite'}><ErrorText value={grid.error} /></Cell>;
}

function FileCell({ grid: { upload } }: { grid: Grid }) {
  if (!upload) return <Cell afterNumber><Missing reason="Typed, no file" /></Cell>;
  return <Cell afterNumber className="whitespace-nowrap"><span title={upload.filename}>{upload.sha256 === null ? upload.filename : <Hash value={upload.sha256} />}</span></Cell>;
}

const floors = { 'round-off': 'it is round-off', 'known-error': 'it is no more than 20 times its known error' } as const;

/** Why a grid, or one of its errors, had no say. */
function whyUnused(grid: Grid, fields: readonly FigureField[]) {
  if (grid.excluded !== null) return `Left out: ${grid.excluded}`;
  const unused = fields.flatMap(({ norms }) => norms.flatMap((part) => {
    const judged = part.grids.find(({ label }) => label === grid.label);
    return judged && !judged.used && judged.unusedReason ? [{ part, reason: judged.unusedReason }] : [];
  }));
  if (unused.length === 0) return null;
  return unused.map(({ part, reason }, index) => (
    <span key={`${part.field} ${part.norm}`}>
      {index > 0 && '; '}<NormSymbol norm={part.norm} /> of <Sym>{part.field}</Sym> was not used: {floors[reason]}
    </span>
  ));
}
