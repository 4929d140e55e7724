'use client';

import type { Me } from '@/lib/domain/people/schema';
import { roleWords } from '@/lib/domain/people/role-words';
import { SignOutButton } from '../auth/sign-out-button';
import { PageTitle } from '../ui/page-title';
import { Section } from '../ui/section';
import { NameLink } from '../ui/text-link';
import { ChangePasswordForm } from './change-password-form';
import { MailChoices } from './mail-choices';
import { NewOrganisationForm } from './new-organisation-form';

function Organisations({ organisations }: Pick<Me, 'organisations'>) {
  if (organisations.length === 0) return <p className="text-graphite">You belong to no organisation. An invitation brings you into one; or make your own below.</p>;
  return (
    <ul className="border-y-[1.5px] border-ink">
      {organisations.map(({ id, slug, name, roles }) => (
        <li key={id} className="flex flex-wrap justify-between gap-x-4 border-t border-hairline py-1.5 first:border-t-0">
          <NameLink href={`/${slug}`} className="font-semibold">{name}</NameLink>
          <span className="text-graphite">{roleWords(roles)}</span>
        </li>
      ))}
    </ul>
  );
}

/** What is a person's own, whatever organisation they work in. */
export function AccountView({ me }: { me: Me }) {
  return (
    <>
      <Section><PageTitle under={me.email}>Account</PageTitle></Section>
      <Section heading="Your organisations"><Organisations organisations={me.organisations} /></Section>
      <Section heading="Make an organisation" note={<p>Organisations see nothing of each other.</p>}><NewOrganisationForm /></Section>
      <Section heading="Mail" note={<p>Mails about your access and your account always come.</p>}><MailChoices /></Section>
      <Section heading="Password"><ChangePasswordForm email={me.email} /></Section>
      <Section heading="Sessions">
        <p>Somebody else may have a browser in which you are signed in? End every session, this one too.</p>
        <SignOutButton everywhere address="/sign-in">Sign out everywhere</SignOutButton>
      </Section>
    </>
  );
}
