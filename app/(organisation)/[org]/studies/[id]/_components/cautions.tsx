import { Section } from '@/app/_components/ui/section';

interface CautionsProps { hasOrders: boolean; hasQuantities: boolean }

/** What an outcome does not show. */
export function Cautions({ hasOrders, hasQuantities }: CautionsProps) {
  return (
    <Section heading="What this does not show">
      <p className="max-w-[46em] text-table text-graphite">
        {hasOrders && 'A code that passes solves these equations as stated. That does not show that they are the right equations, that another problem’s mesh is fine enough, or that a design is safe. '}
        {hasQuantities && 'The grid convergence index is an uncertainty estimate of about 95 % by experience, not a bound. '}
        Where results bear on safety, the applicable codes and standards and the judgement of a licensed engineer decide.
      </p>
    </Section>
  );
}
