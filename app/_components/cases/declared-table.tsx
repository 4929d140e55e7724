import { defaultTolerance } from '@/lib/numerics/outcome/default-tolerance';
import { regularOrder } from '@/lib/numerics/outcome/regular-order';
import type { CaseDefinition, DeclaredNorm } from '@/lib/domain/cases/definition';
import { withElementOrders } from '@/lib/domain/cases/element-orders';
import { Cell, HeadCell, Missing, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { NormSymbol, Sym } from '../ui/symbols';

function OrderCell({ norm }: { norm: DeclaredNorm }) {
  if (norm.expectExact) return <Cell num>exact</Cell>;
  if (norm.formalOrder === undefined) return <Cell num><Missing reason="No formal order: shown, not judged" /></Cell>;
  const left = norm.regularity === undefined ? norm.formalOrder : regularOrder(norm.norm, norm.formalOrder, norm.regularity);
  const aside = [
    ...(norm.derivedOrder === undefined ? [] : [`formal ${norm.formalOrder}`]),
    ...(norm.regularity === undefined ? [] : [`regularity ${norm.regularity} of ${norm.formalOrder}`]),
    ...(norm.logFactor === undefined ? [] : [`log factor ${norm.logFactor}`]),
  ];
  return <Cell num>{Number((norm.derivedOrder ?? left).toPrecision(6))}{aside.length > 0 && <span className="text-graphite"> ({aside.join(', ')})</span>}</Cell>;
}

function ToleranceCell({ norm }: { norm: DeclaredNorm }) {
  const order = norm.derivedOrder ?? norm.formalOrder;
  if (norm.expectExact || order === undefined) return <Cell num><Missing reason="No tolerance" /></Cell>;
  const tolerance = norm.tolerance ?? defaultTolerance(norm.norm, order);
  return <Cell num>{Number(tolerance.toPrecision(6))}{norm.tolerance === undefined && <span className="text-graphite"> (rule)</span>}</Cell>;
}

/** What a case declares for each field and norm, and where it comes from. */
export function DeclaredTable({ definition }: { definition: Pick<CaseDefinition, 'fields' | 'quantities' | 'elements'> }) {
  const { fields } = withElementOrders(definition);
  return (
    <Table caption="Formal orders and tolerances, by field and norm." hideCaption>
      <Head><tr><HeadCell>Field</HeadCell><HeadCell>Norm</HeadCell><HeadCell num>Order</HeadCell><HeadCell num>Tolerance</HeadCell><HeadCell afterNumber>Counts</HeadCell><HeadCell>Comes from</HeadCell></tr></Head>
      <tbody>
        {fields.flatMap(({ field, norms }) => norms.map((norm, index) => (
          <Row key={`${field} ${norm.norm}`} startsGroup={index === 0}>
            <RowHead>{index === 0 && <Sym>{field}</Sym>}</RowHead>
            <Cell><NormSymbol norm={norm.norm} /></Cell>
            <OrderCell norm={norm} />
            <ToleranceCell norm={norm} />
            <Cell afterNumber>{norm.counts ? 'yes' : 'no'}</Cell>
            <Cell className="min-w-40">{norm.backing && 'citation' in norm.backing ? norm.backing.citation : <Missing reason="No source stated" />}</Cell>
          </Row>
        )))}
      </tbody>
    </Table>
  );
}
