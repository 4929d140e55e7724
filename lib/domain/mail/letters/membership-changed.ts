import { roleWords } from '../../people/role-words';
import { dateWords } from '../date-words';
import { linkTo, type Letter, type LetterLinks } from '../letter';
import type { LetterFacts } from '../letter-facts';

export function writeMembershipChanged(facts: Extract<LetterFacts, { kind: 'membership-changed' }>, links: LetterLinks): Letter {
  const { organisation, slug, by, roles, until } = facts;
  const note = `This is about your access, so it always comes. Questions: ${by}.`;
  if (roles === null) {
    return {
      subject: `Your access to ${organisation} has ended`,
      paragraphs: [`${by} removed you from ${organisation}. Your tokens there no longer work; what you did keeps your name.`],
      facts: [], action: null, note,
    };
  }
  return {
    subject: `Your roles in ${organisation} have changed`,
    paragraphs: [`${by} changed what you may do in ${organisation}: you are ${roleWords(roles)} now.`],
    facts: until === null ? [] : [{ name: 'Access ends', value: dateWords(until) }],
    action: { label: `Open ${organisation}`, url: linkTo(links, `/${slug}`) },
    note,
  };
}
