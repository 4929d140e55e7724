import type { CaseDefinition } from '@/lib/domain/cases/definition';
import { formatCount } from '@/lib/domain/numbers/format-count';
import { formatRatio } from '@/lib/domain/numbers/format-ratio';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { Sym } from '../ui/symbols';

type PlannedGrid = CaseDefinition['gridPlan'][number];

/** The spacing a plan states, up to a factor that is the same for all its grids; null where it states none. */
function relativeSpacing({ h, cells, cellsPerDirection, dt }: PlannedGrid, dimension: number): number | null {
  if (h !== undefined) return h;
  if (cells !== undefined) return cells ** (-1 / dimension);
  if (cellsPerDirection === undefined) return dt ?? null;
  const counts = Array.isArray(cellsPerDirection) ? cellsPerDirection : [cellsPerDirection];
  return counts.reduce((product, count) => product * count, 1) ** (-1 / counts.length);
}

const columns = [
  { name: 'Cells per direction', show: ({ cellsPerDirection: each }: PlannedGrid) => (each === undefined ? null : Array.isArray(each) ? each.map(formatCount).join(' × ') : formatCount(each)) },
  { name: 'Cells in all', show: ({ cells }: PlannedGrid) => (cells === undefined ? null : formatCount(cells)) },
  { name: <Sym>h</Sym>, show: ({ h }: PlannedGrid) => (h === undefined ? null : String(h)) },
  { name: 'Time step', show: ({ dt }: PlannedGrid) => (dt === undefined ? null : String(dt)) },
] as const;

/** The planned grids, and by what ratio each refines the one before. */
export function GridPlanTable({ gridPlan, dimension }: { gridPlan: readonly PlannedGrid[]; dimension: number }) {
  const used = columns.filter(({ show }) => gridPlan.some((grid) => show(grid) !== null));
  return (
    <Table caption="Grid plan." hideCaption>
      <Head><tr><HeadCell>Grid</HeadCell>{used.map(({ name }, index) => <HeadCell key={index} num>{name}</HeadCell>)}<HeadCell num>Ratio to the grid before</HeadCell></tr></Head>
      <tbody>
        {gridPlan.map((grid, index) => {
          const before = gridPlan[index - 1];
          const [coarse, fine] = [before ? relativeSpacing(before, dimension) : null, relativeSpacing(grid, dimension)];
          return (
            <Row key={grid.label}>
              <RowHead>{grid.label}</RowHead>
              {used.map(({ show }, column) => <Cell key={column} num>{show(grid) ?? <Missing reason="Not stated" />}</Cell>)}
              <Cell num>{coarse !== null && fine !== null ? formatRatio(coarse / fine) : <Missing reason={index === 0 ? 'First grid' : 'Spacing not stated'} />}</Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}
