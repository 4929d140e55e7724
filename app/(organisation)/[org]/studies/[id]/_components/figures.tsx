import { ErrorFigure } from '@/app/_components/figures/error-figure';
import { ErrorFigureNote } from '@/app/_components/figures/error-figure-note';
import { ValueFigure } from '@/app/_components/figures/value-figure';
import { NormSymbol } from '@/app/_components/ui/symbols';
import type { Assessment } from '@/lib/domain/assessment/schema';
import type { Study } from '@/lib/domain/studies/schema';
import type { FieldAssessment } from '@/lib/numerics/assessment';

/** Errors and orders of all fields first, then each quantity against spacing. */
export function StudyFigures({ assessment: { fields, quantities } }: { assessment: Assessment }) {
  const first = fields.length > 0 ? 1 : 0;
  return (
    <>
      {first === 1 && <div className="mt-8"><ErrorFigure fields={fields} /></div>}
      {quantities.map((quantity, index) => (
        <div key={quantity.name} className="mt-8">
          <ValueFigure quantity={quantity} number={first + index + 1} caption={quantities.length > 1 ? `${quantity.name} against spacing.` : undefined} />
        </div>
      ))}
    </>
  );
}

/** Where the formal orders come from and what they are judged by. */
export function FigureNotes({ study: { definition }, fields }: { study: Study; fields: readonly FieldAssessment[] }) {
  if (fields.length === 0) return null;
  const citations = new Set(definition.fields.flatMap(({ norms }) => norms.flatMap(({ backing }) => (backing && 'citation' in backing ? [backing.citation] : []))));
  const formals = [...new Set(fields.flatMap(({ derivedOrder, formalOrder }) => derivedOrder ?? formalOrder ?? []))];
  const tolerances = new Map(fields.flatMap(({ norm, tolerance }) => (tolerance === null ? [] : [[norm, tolerance] as const])));
  return (
    <div className="mt-4 flex flex-col gap-2">
      {formals.length > 0 && (
        <p>
          <b>Formal order {formals.join(' and ')}</b>{citations.size > 0 ? `: ${[...citations].join('; ')}` : ', declared in the case without a source.'}
        </p>
      )}
      {tolerances.size > 0 && (
        <p>
          <b>Band</b> from the formal order − tolerance to + twice the tolerance; tolerance{' '}
          {[...tolerances].map(([norm, tolerance], index) => <span key={norm}>{index > 0 && ', '}{Number(tolerance.toPrecision(4))} for <NormSymbol norm={norm} /></span>)}.
        </p>
      )}
      <ErrorFigureNote fields={fields} />
    </div>
  );
}
