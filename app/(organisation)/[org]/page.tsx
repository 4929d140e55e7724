import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { cookies } from 'next/headers';
import { lastCodeCookie } from '@/app/_components/matrix/last-code';
import { MatrixView } from '@/app/_components/matrix/matrix-view';
import { NoCodes } from '@/app/_components/matrix/no-codes';
import { single, type SearchParams } from '@/app/_components/lists/list-query';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { listCodesContract } from '@/lib/domain/codes/schema';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { rolesCarry } from '@/lib/domain/people/roles';
import { listCodes } from '@/lib/services/codes/list-codes';
import { getMatrix } from '@/lib/services/matrix/get-matrix';

export const metadata: Metadata = { title: 'Release matrix' };

interface HomePageProps { params: Promise<{ org: string }>; searchParams: SearchParams }

/** The home of an organisation: the release matrix of the code in the address, else of the one last looked at. */
export default async function HomePage({ params, searchParams }: HomePageProps) {
  const { org: organisation } = await params;
  const asked = single((await searchParams).code);
  const member = await requireMember(organisation);
  if (!rolesCarry(member.roles, 'work.read')) return <NoCodes />;
  const query = { limit: 50 };
  const codes = await listCodes(member, query);
  const remembered = (await cookies()).get(lastCodeCookie(organisation))?.value;
  const known = codes.items.find(({ slug }) => slug === remembered) ?? codes.items[0];
  const code = asked ?? known?.slug;
  if (code === undefined) return <NoCodes />;
  const state = await prefetch(
    answerOf(listCodesContract, { organisation, query }, Promise.resolve(codes)),
    answerOf(getMatrixContract, { organisation, params: { code } }, getMatrix(member, code)),
  );
  return <HydrationBoundary state={state}><MatrixView key={code} code={code} /></HydrationBoundary>;
}
