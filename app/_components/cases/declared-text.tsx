import type { CaseDefinition } from '@/lib/domain/cases/definition';
import { withElementOrders } from '@/lib/domain/cases/element-orders';
import { Sym } from '../ui/symbols';

type Declared = Pick<CaseDefinition, 'fields' | 'quantities' | 'elements'>;

function orderOfField({ norms }: Declared['fields'][number]): string {
  if (norms.some((norm) => norm.expectExact)) return 'exact';
  const orders = [...new Set(norms.filter((norm) => norm.counts).flatMap((norm) => norm.derivedOrder ?? norm.formalOrder ?? []))];
  return orders.length === 0 ? 'no order' : orders.join(' and ');
}

/** What a case declares, in a line: "u 2, p 1, lift". */
export function DeclaredText({ definition }: { definition: Declared }) {
  const { fields, quantities } = withElementOrders(definition);
  if (fields.length + quantities.length === 0) return <span className="text-graphite">nothing</span>;
  return (
    <>
      {fields.map((field, index) => <span key={field.field}>{index > 0 && ', '}<Sym>{field.field}</Sym> {orderOfField(field)}</span>)}
      {quantities.map((quantity, index) => <span key={quantity.name}>{fields.length + index > 0 && ', '}{quantity.name}</span>)}
    </>
  );
}
