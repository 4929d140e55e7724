'use client';

import { useEffect } from 'react';
import { listCodesContract } from '@/lib/domain/codes/schema';
import { getMatrixContract, type Matrix } from '@/lib/domain/matrix/schema';
import { Answered } from '../api/answered';
import { useApi } from '../api/use-api';
import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { ButtonLink } from '../ui/button-link';
import { EmptyState } from '../ui/empty-state';
import { PageTitle, Statement } from '../ui/page-title';
import { Section } from '../ui/section';
import { TextLink } from '../ui/text-link';
import { lastCodeCookie } from './last-code';
import { MarksLegend } from './marks-legend';
import { MatrixTable } from './matrix-table';
import { standingReason, standingWords } from './release-statement';
import { WorseSection } from './worse-section';

const isUnderWay = ({ cases }: Matrix) => cases.some(({ cells }) => cells.some(({ state }) => state === 'collecting' || state === 'assessing'));

export function MatrixView({ code }: { code: string }) {
  const { slug } = useOrganisation();
  const query = useApi(getMatrixContract, { organisation: slug, params: { code } }, { refetchEvery: (matrix) => (isUnderWay(matrix) ? 4000 : false) });
  useEffect(() => {
    document.cookie = `${lastCodeCookie(slug)}=${encodeURIComponent(code)}; path=/; max-age=31536000; samesite=lax`;
  }, [slug, code]);
  return (
    <OrganisationPage place={[{ label: query.data?.code.name ?? code }]}>
      <Answered query={query} inSection>{(matrix) => <MatrixSections matrix={matrix} />}</Answered>
    </OrganisationPage>
  );
}

function ReleaseStatement({ matrix }: { matrix: Matrix }) {
  const release = matrix.releases.findLast(({ state }) => state !== 'withdrawn') ?? matrix.releases.at(-1);
  if (!release) return null;
  const look = { stands: 'text-pass-text', 'does-not-stand': 'text-fail-text', incomplete: '', withdrawn: '' }[release.standing];
  return (
    <Statement>
      {matrix.code.name} {release.version} <span className={`font-semibold ${look}`}>{standingWords[release.standing]}</span>
      {release.standing !== 'withdrawn' && `: ${standingReason(release, matrix.cases.length)}`}.
    </Statement>
  );
}

function OtherCodes({ code }: { code: string }) {
  const { slug } = useOrganisation();
  const codes = useApi(listCodesContract, { organisation: slug, query: { limit: 50 } });
  const others = codes.data?.items.filter((each) => each.slug !== code) ?? [];
  if (others.length === 0) return null;
  return (
    <div>
      <p><b>Other codes</b></p>
      <ul>{others.map((each) => <li key={each.id}><TextLink href={`/${slug}?code=${each.slug}`}>{each.name}</TextLink></li>)}</ul>
    </div>
  );
}

function MatrixSections({ matrix }: { matrix: Matrix }) {
  const { slug, may } = useOrganisation();
  const codePage = `/${slug}/codes/${matrix.code.slug}`;
  const counts = `${matrix.cases.length} case${matrix.cases.length === 1 ? '' : 's'}, ${matrix.releases.length} release${matrix.releases.length === 1 ? '' : 's'}.`;
  const isEmpty = matrix.cases.length === 0 || matrix.releases.length === 0;
  const actions = may('work.write') && (
    <>
      {matrix.releases.length === 0 && <ButtonLink href={codePage} kind="primary">Make a release</ButtonLink>}
      {matrix.cases.length === 0 && <ButtonLink href={`/${slug}/cases/new?code=${matrix.code.slug}`}>Make a case</ButtonLink>}
    </>
  );
  return (
    <>
      <Section note={<><OtherCodes code={matrix.code.slug} />{!isEmpty && <MarksLegend />}</>}>
        <PageTitle under={<>{counts} <TextLink href={codePage}>Releases and cases of {matrix.code.name}</TextLink></>}>{matrix.code.name}</PageTitle>
        {isEmpty
          ? <div className="mt-6"><EmptyState needed="Studies fill its cells: a case, run on a release, on several grids." actions={actions}>Cases down and releases across: the release matrix of {matrix.code.name} belongs here.</EmptyState></div>
          : <><ReleaseStatement matrix={matrix} /><div className="mt-6"><MatrixTable matrix={matrix} /></div></>}
      </Section>
      {!isEmpty && <WorseSection matrix={matrix} slug={slug} />}
    </>
  );
}
