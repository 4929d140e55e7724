'use client';

import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { TokenForm } from './token-form';
import { TokenList } from './token-list';

export function TokensView({ query }: { query: { limit: number; cursor?: string } }) {
  const { may, roles, name } = useOrganisation();
  return (
    <OrganisationPage place={[{ label: 'Tokens' }]}>
      <Section note={<p>A <b>token</b> lets a script or a pipeline act as you, with your roles and no more. Its secret is kept only by whoever copied it.</p>}>
        <PageTitle under="Yours, in this organisation.">Tokens</PageTitle>
        <div className="mt-6">
          {may('tokens.manage') ? <TokenList query={query} /> : <p className="text-graphite">Tokens belong to engineers and owners. You are {roles.join(' and ')} in {name}.</p>}
        </div>
      </Section>
      {may('tokens.manage') && <Section heading="Make a token"><TokenForm /></Section>}
    </OrganisationPage>
  );
}
