import type { Letter, LetterLinks } from './letter';
import type { LetterFacts } from './letter-facts';
import { writeInvitation } from './letters/invitation';
import { writeMembershipChanged } from './letters/membership-changed';
import { writePasswordChanged } from './letters/password-changed';
import { writePasswordReset } from './letters/password-reset';
import { writeStudyFailed } from './letters/study-failed';

/** What a mail says, from the facts of its kind. */
export function writeLetter(facts: LetterFacts, links: LetterLinks): Letter {
  switch (facts.kind) {
    case 'invitation': return writeInvitation(facts, links);
    case 'password-reset': return writePasswordReset(links);
    case 'password-changed': return writePasswordChanged(facts, links);
    case 'membership-changed': return writeMembershipChanged(facts, links);
    case 'study-failed': return writeStudyFailed(facts, links);
  }
}
