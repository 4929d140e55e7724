import type { ReactNode } from 'react';
import { QueryProvider } from '@/app/_components/api/query-provider';
import { OrganisationProvider } from '@/app/_components/organisation/organisation-context';
import { SignInAgain } from '@/app/_components/standing/sign-in-again';
import { WatchAccess } from '@/app/_components/standing/watch-access';
import { requireMember } from '@/app/_server/visit';
import { getMe } from '@/lib/services/people/get-me';

interface OrganisationLayoutProps { params: Promise<{ org: string }>; children: ReactNode }

export default async function OrganisationLayout({ params, children }: OrganisationLayoutProps) {
  const { org } = await params;
  const member = await requireMember(org);
  const { id: userId, email, organisations } = await getMe(member);
  const scope = { userId, email, organisations, organisation: { ...member.organisation, roles: member.roles } };
  return (
    <QueryProvider>
      <OrganisationProvider scope={scope}>
        <SignInAgain />
        <WatchAccess />
        {children}
      </OrganisationProvider>
    </QueryProvider>
  );
}
