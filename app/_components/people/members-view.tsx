'use client';

import { useOrganisation } from '../organisation/organisation-context';
import { OrganisationPage } from '../organisation/organisation-page';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { InvitationList } from './invitation-list';
import { InviteForm } from './invite-form';
import { MemberList } from './member-list';
import { OrganisationName } from './organisation-name';

export function MembersView({ query }: { query: { limit: number; cursor?: string } }) {
  const { may, roles, name } = useOrganisation();
  const manages = may('people.manage');
  return (
    <OrganisationPage place={[{ label: 'Members' }]}>
      <Section note={<p>Nobody makes themselves <b>reviewer</b> or <b>owner</b>: a signature stands for a second person’s judgement.</p>}>
        <PageTitle under={`Who belongs to ${name}, and what they may do.`}>Members</PageTitle>
        <div className="mt-6">{may('people.read') ? <MemberList query={query} /> : <p className="text-graphite">Members are listed for engineers, reviewers and owners. You are {roles.join(' and ')} in {name}.</p>}</div>
      </Section>
      {may('people.read') && (
        <Section heading="Invitations" note={<p>An invitation holds for seven days. Sent again, the link of the mail before no longer works.</p>}><InvitationList /></Section>
      )}
      {manages
        ? <Section heading="Invite somebody"><InviteForm /></Section>
        : may('people.read') && <Section><p className="text-note text-graphite">To invite or change members you need the role owner. You are {roles.join(' and ')} in {name}.</p></Section>}
      {manages && <Section heading="The organisation"><OrganisationName /></Section>}
    </OrganisationPage>
  );
}
