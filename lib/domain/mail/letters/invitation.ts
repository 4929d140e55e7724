import { invitationDays } from '../../invitations/days';
import { roleWords } from '../../people/role-words';
import { dateWords } from '../date-words';
import { linkTo, type Letter, type LetterLinks } from '../letter';
import type { LetterFacts } from '../letter-facts';

export function writeInvitation(facts: Extract<LetterFacts, { kind: 'invitation' }>, links: LetterLinks): Letter {
  const { organisation, invitedBy, roles, codes, until } = facts;
  return {
    subject: `Invitation to ${organisation} on Fourfold`,
    paragraphs: [
      `${invitedBy} invites you to ${organisation} as ${roleWords(roles)}.`,
      'Fourfold is where the organisation shows at which order its solvers converge, and where others check it.',
    ],
    facts: [
      ...(roles.includes('auditor') ? [{ name: 'Codes', value: codes === null ? 'all' : codes.join(', ') }] : []),
      ...(until === null ? [] : [{ name: 'Access ends', value: dateWords(until) }]),
    ],
    action: { label: 'Accept the invitation', url: linkTo(links, `/accept-invitation?token=${links.token ?? ''}`) },
    note: `The link holds for ${invitationDays} days and for this address. If you do not know ${invitedBy}, ignore this mail: nothing happens.`,
  };
}
