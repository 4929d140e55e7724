import type { CaseDefinition } from './definition';
import { withElementOrders } from './element-orders';

/** From this order on averages and point values are apart: they differ by h². */
const averagesMatter = 3;

/** What follows from where the values and the source terms of a case live; it wants a look and decides nothing. */
export function explainSampling(definition: CaseDefinition): string[] {
  const { sampling, sourceSampling, elements } = definition;
  const orders = withElementOrders(definition).fields.flatMap(({ norms }) => norms.flatMap(({ formalOrder, derivedOrder }) => derivedOrder ?? formalOrder ?? []));
  if (Math.max(0, ...orders) < averagesMatter || elements) return [];
  return [
    ...(sampling === 'average' ? ['Compare conserved variables: primitive ones formed from their averages are second order whatever the scheme.'] : []),
    ...(sampling === 'average' && sourceSampling === 'point' ? ['Values are averages while source terms are point values: the two differ by h², so that order 2 shows whatever the scheme.'] : []),
    ...(sampling === 'point' && sourceSampling === 'average' ? ['Values are compared as points while source terms are averages: the two differ by h², so that order 2 shows whatever the scheme.'] : []),
    ...(sampling === 'point' && sourceSampling === 'point' ? ['Values and source terms are both point values: right where the scheme keeps points. Where it keeps averages both are off by h², and two such errors can cancel.'] : []),
  ];
}
