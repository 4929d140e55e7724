import { dateWords } from '../date-words';
import { linkTo, type Letter, type LetterLinks } from '../letter';
import type { LetterFacts } from '../letter-facts';

export function writePasswordChanged({ at }: Extract<LetterFacts, { kind: 'password-changed' }>, links: LetterLinks): Letter {
  return {
    subject: 'Your password for Fourfold was changed',
    paragraphs: [`The password of your account was changed on ${dateWords(at)}, and other sessions were ended.`],
    facts: [],
    action: { label: 'Set another password', url: linkTo(links, '/reset-password') },
    note: 'If it was you, there is nothing to do. If not, set another password now and tell the owners of your organisation.',
  };
}
