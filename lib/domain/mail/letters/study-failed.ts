import { linkTo, type Letter, type LetterLinks } from '../letter';
import type { LetterFacts } from '../letter-facts';

export function writeStudyFailed(facts: Extract<LetterFacts, { kind: 'study-failed' }>, links: LetterLinks): Letter {
  const { organisation, slug, study, code, release, caseName, statement, failing } = facts;
  return {
    subject: `Fail: ${caseName}, ${code} ${release}`,
    paragraphs: [statement],
    facts: [
      { name: 'Case', value: caseName }, { name: 'Code and release', value: `${code} ${release}` },
      { name: 'Fails in', value: failing.join('; ') }, { name: 'Organisation', value: organisation },
    ],
    action: { label: 'Open the study', url: linkTo(links, `/${slug}/studies/${study}`) },
    note: `You made this study or sent files to it. Choose which mails come: ${linkTo(links, '/account')}`,
  };
}
