import { linkTo, type Letter, type LetterLinks } from '../letter';

export function writePasswordReset(links: LetterLinks): Letter {
  return {
    subject: 'Set a new password for Fourfold',
    paragraphs: ['Somebody, probably you, asked for a new password for the account of this address.'],
    facts: [],
    action: { label: 'Set a new password', url: linkTo(links, `/reset-password?token=${links.token ?? ''}`) },
    note: 'The link holds for one hour and serves once. If you did not ask for it, ignore this mail: the password stays as it is.',
  };
}
