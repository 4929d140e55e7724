import type { ReactNode } from 'react';
import { ErrorRasters, RasterScale } from './_components/front/error-rasters';
import { PublicPage } from './_components/public/public-page';
import { ButtonLink } from './_components/ui/button-link';
import { OutcomeWord } from './_components/ui/outcome-word';
import { Section } from './_components/ui/section';
import { NormSymbol } from './_components/ui/symbols';
import { findHome } from './_server/visit';

const parts = [
  { name: 'What is promised', text: 'For every field and norm the formal order, where it comes from, and how far the observed order may lie from it.' },
  { name: 'What is solved', text: 'The equations, the domain and the exact or manufactured solution, written once and typeset.' },
  { name: 'Which grids', text: 'Their spacing and number, decided and frozen before the first file arrives. A later change is marked wherever it matters.' },
  { name: 'What came out', text: 'The solver’s own output, read as it is. Error norms, observed orders, extrapolated value and grid convergence index follow from it.' },
  { name: 'What it comes to', text: <><OutcomeWord mark="pass" />, <OutcomeWord mark="fail" /> or <OutcomeWord mark="inconclusive" />, each with its reason in numbers and the next step.</> },
  { name: 'Release by release', text: 'One page of cases and releases: what holds, what broke, and which errors grew although the order stayed.' },
] as const;

const people = [
  { name: 'Engineers', text: 'plan grids, send output by hand or from a pipeline, and see why an order is missed.' },
  { name: 'Reviewers', text: 'read every study of the organisation as it was computed, with the files behind it.' },
] as const;

function Rows({ rows, isNumbered }: { rows: readonly { name: string; text: ReactNode }[]; isNumbered?: boolean }) {
  return (
    <dl className="border-y-[1.5px] border-ink">
      {rows.map(({ name, text }, index) => (
        <div key={name} className="grid gap-x-4 border-t border-hairline py-2 first:border-t-0 tablet:grid-cols-[280px_minmax(0,1fr)]">
          <dt className="font-serif text-[16px] font-semibold">
            {isNumbered && <span className="mr-3 font-sans font-normal text-graphite" aria-hidden>{index + 1}</span>}{name}
          </dt>
          <dd>{text}</dd>
        </div>
      ))}
    </dl>
  );
}

export default async function FrontPage() {
  const home = await findHome();
  return (
    <PublicPage home={home}>
      <Section>
        <h1 className="mt-4 font-serif text-front-phone text-balance tablet:mt-8 tablet:text-front">Half the spacing, a quarter of the error</h1>
        <p className="mt-4 max-w-[40em] font-serif text-lead-phone tablet:text-[19px] tablet:leading-7">
          That is what a second-order solver promises. Fourfold holds each release of yours to the order its schemes promise, and keeps what somebody else needs to check it.
        </p>
      </Section>
      <Section
        note={
          <>
            <p>A Poisson equation with a manufactured solution, solved here with five-point differences on four grids, each with half the spacing of the one before.</p>
            <p>The farther from the paper, the larger the error of a cell; it vanishes along the curves where it changes sign.</p>
            <RasterScale />
            <p>Below each grid the <NormSymbol norm="L2" /> error, and by how much it fell.</p>
          </>
        }
        heading="One problem on four grids"
      >
        <ErrorRasters />
        <div className="mt-8 flex flex-wrap items-center gap-3">
          <ButtonLink kind="primary" href="/quick-check">Check a series</ButtonLink>
          {home ? <ButtonLink href={home}>Go to your organisation</ButtonLink> : <><ButtonLink href="/sign-in">Sign in</ButtonLink><ButtonLink href="/sign-up">Sign up</ButtonLink></>}
          <span className="text-note text-graphite">The check needs no account and stays in your browser.</span>
        </div>
      </Section>
      <Section heading="What a study holds" note={<p>For groups that develop or own a flow or structures solver.</p>}><Rows rows={parts} isNumbered /></Section>
      <Section heading="Who works with it">
        <Rows rows={people} />
        <p className="mt-6 max-w-[46em] font-serif text-[16px] leading-6 italic text-graphite">
          A passed study says that the equations are solved as stated. Whether they are the right equations, whether the mesh of another problem is fine enough and whether a design is safe are other questions.
        </p>
      </Section>
    </PublicPage>
  );
}
