import type { Metadata } from 'next';
import { OperatingTable } from '@/app/_components/docs/operating-table';
import { PublicPage } from '@/app/_components/public/public-page';
import { Formula } from '@/app/_components/ui/formula';
import { OutcomeWord } from '@/app/_components/ui/outcome-word';
import { PageTitle } from '@/app/_components/ui/page-title';
import { procedureNames, procedureSources } from '@/lib/domain/assessment/explain-procedure';
import { procedures } from '@/lib/numerics/assessment';
import { findHome } from '@/app/_server/visit';
import { Section } from '@/app/_components/ui/section';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';

export const metadata: Metadata = { title: 'Methods and sources' };

const prose = 'flex max-w-[46em] flex-col gap-3';

export default async function MethodsPage() {
  return (
    <PublicPage title="Methods" home={await findHome()}>
      <Section>
        <PageTitle under="What is computed, from which published procedure, and how an outcome is reached.">Methods and sources</PageTitle>
        <p className="mt-4 max-w-[46em]">Grid 1 is the finest. The browser, the server and the tests compute with the same code.</p>
      </Section>
      <Section heading="Spacing" note={<p>Counts per direction taken for totals would double or treble an order: say which they are.</p>}>
        <div className={prose}>
          <p>The spacing <Sym>h</Sym> is taken as stated, else from the number of cells, from the cells per direction, or from the sum of the weights. Only ratios of spacings matter.</p>
          <Formula tex="h = \left(V/N\right)^{1/D}" />
          <p>Two grids make a pair when their spacings differ by 1.3 or more; a series must span a ratio of 2.</p>
        </div>
      </Section>
      <Section heading="Error norms" note={<p>Sums are compensated. Rows without a weight count alike only where that was said.</p>}>
        <div className={prose}>
          <p>With the exact solution known and weights <Sym>w</Sym> from the file:</p>
          <Formula tex="L_1 = \frac{\sum w_i |e_i|}{\sum w_i}" />
          <Formula tex="L_2 = \sqrt{\frac{\sum w_i e_i^2}{\sum w_i}}" />
          <Formula tex="L_\infty = \max |e_i|" />
          <p>What the digits of a file or an unfinished iteration leave unknown is carried into the uncertainty of each order.</p>
        </div>
      </Section>
      <Section heading="Observed order" note={<><p>I. Celik, U. Ghia, P. J. Roache, C. Freitas, H. Coleman, P. Raad, J. Fluids Eng. 130, 078001, 2008.</p><p>Differences keep their sign here: without it a diverging series would show a positive order.</p></>}>
        <div className={prose}>
          <p>From errors, for each pair of a coarse and a fine grid:</p>
          <Formula tex="p = \frac{\ln (E_c/E_f)}{\ln r}" />
          <p>From values on three grids without an exact one, the root of</p>
          <Formula tex="\ln\frac{r_{21}^{\,p}-1}{r_{32}^{\,p}-1} - p \ln r_{21} - \ln\frac{\varepsilon_{21}}{\varepsilon_{32}} = 0" />
          <p>between −10 and 20. The values converge monotonically where 0 &lt; <Sym index="21">ε</Sym>/<Sym index="32">ε</Sym> &lt; ln <Sym index="21">r</Sym>/ln <Sym index="32">r</Sym>; the usual bound of 1 holds for equal ratios only.</p>
          <p>Fields without an exact solution are compared from one grid or time step to the next, on the same points; the same equation then takes the norms of two differences. A much finer solution in the place of the exact one would show too high an order.</p>
        </div>
      </Section>
      <Section heading="Extrapolated value and grid convergence index" note={<p>An estimate that covers the error in about 95 % of cases by experience. It is not a bound.</p>}>
        <div className={prose}>
          <Formula tex="\varphi_0 = \frac{r_{21}^{\,p}\varphi_1 - \varphi_2}{r_{21}^{\,p}-1}" />
          <Formula tex="\mathrm{GCI} = F_s\,\frac{|(\varphi_1-\varphi_2)/\varphi_1|}{r_{21}^{\,p}-1}" />
          <p>The safety factor is 1.25 with an order observed on three grids, and 3 with two grids and the formal order. Where values oscillate or the order is not positive, half their range is given instead.</p>
        </div>
      </Section>
      <Section heading="Procedures" note={procedures.map((procedure) => <p key={procedure}><b>{procedureNames[procedure]}.</b> {procedureSources[procedure]}</p>)}>
        <div className={prose}>
          <p><b>Three-grid.</b> The observed order of the three finest grids, with a safety factor of 1.25.</p>
          <p><b>Guarded order.</b> Within 10 % of the formal order, that and a factor of 1.25; otherwise a factor of 3 and the observed order, kept between 0.5 and the formal one.</p>
          <p><b>Least squares.</b> A fit over all grids, four or more; its uncertainty is called U. Made for nominally second-order codes.</p>
          <p><b>Correction factor.</b> U from how far the observed order is from the formal one.</p>
          <p>Two grids show no order: the formal one is taken with a factor of 3, whatever the procedure.</p>
        </div>
      </Section>
      <Section heading="Outcome" note={<><p>A pass needs the last two orders in the band, and errors that still fall.</p><p>A plateau is evidence. It is never left out.</p></>}>
        <div className={prose}>
          <p>The band reaches from the tolerance below the formal order to twice the tolerance above it. Unless a case says otherwise the tolerance is the larger of 0.1 and 5 % of the order, for <NormSymbol norm="Linf" /> 0.2 and 10 %.</p>
          <p><OutcomeWord mark="pass" />: the last two orders lie in the band and do not move away. <OutcomeWord mark="fail" />: they lie below it and do not climb, or climb towards a limit below it. <OutcomeWord mark="inconclusive" />: the data do not decide, for the reason given.</p>
        </div>
      </Section>
      <OperatingTable />
      <Section heading="What a pass does not say">
        <p className="max-w-[46em] font-serif text-[16px] leading-6">
          Code verification shows that equations are solved as stated. It does not show that they are the right equations, that the mesh of another problem is fine enough, or that a design is safe. Where results bear on safety, the applicable codes and standards and the judgement of a licensed engineer come first.
        </p>
      </Section>
    </PublicPage>
  );
}
