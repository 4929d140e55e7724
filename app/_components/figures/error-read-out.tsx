import { Fragment } from 'react';
import { formatError } from '@/lib/domain/numbers/format-error';
import { formatOrder } from '@/lib/domain/numbers/format-order';
import type { FigureField } from '@/lib/figures/error-figure/figure-fields';
import { spacingLabel } from '@/lib/figures/spacing-label';
import { NormSymbol, Sym } from '../ui/symbols';
import { ErrorText } from './error-text';

export interface ReadGrid { label: string; h: number }

const errorsAt = (field: FigureField, label: string) =>
  field.norms.flatMap(({ norm, grids, orders }) => {
    const grid = grids.find((each) => each.label === label);
    const order = orders.find(({ fine }) => fine === label)?.order ?? null;
    return grid ? [{ norm, error: grid.error, used: grid.used, order }] : [];
  });

/** The read-out in plain words, for the accessible value of the figure. */
export function readOutWords(fields: readonly FigureField[], grid: ReadGrid): string {
  const parts = fields.map((field) => `${field.field}: ${errorsAt(field, grid.label)
    .map(({ norm, error, order }) => `${norm === 'Linf' ? 'L∞' : norm} ${formatError(error).text}${order === null ? '' : `, order ${formatOrder(order)}`}`).join('; ')}`);
  return `Grid ${grid.label}, spacing ${spacingLabel(grid.h)}. ${parts.join('. ')}`;
}

/** One line of numbers for the grid under the pointer; with one field also the orders from the next coarser grid. */
export function ErrorReadOut({ fields, grid }: { fields: readonly FigureField[]; grid: ReadGrid }) {
  const first = fields[0];
  const orders = fields.length === 1 && first ? errorsAt(first, grid.label).filter(({ order }) => order !== null) : [];
  return (
    <p className="mt-1 flex min-h-5 flex-wrap gap-x-3 text-note text-graphite">
      <span>Grid {grid.label}, <Sym>h</Sym> {spacingLabel(grid.h)}:</span>
      {fields.map((field) => (
        <span key={field.field}>
          <Sym>{field.field}</Sym>
          {errorsAt(field, grid.label).map(({ norm, error, used }) => (
            <Fragment key={norm}>
              {' '}<span className="ml-1 whitespace-nowrap"><NormSymbol norm={norm} /> <span className={used ? 'text-ink' : ''}><ErrorText value={error} />{used ? '' : ', left out'}</span></span>
            </Fragment>
          ))}
        </span>
      ))}
      {orders.length > 0 && (
        <span>
          order <span className="text-ink">{orders.map(({ order }) => formatOrder(order ?? 0)).join(', ')}</span>
        </span>
      )}
    </p>
  );
}
