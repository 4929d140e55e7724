'use client';

import type { Member } from '@/lib/domain/members/schema';
import { useOrganisation } from '../organisation/organisation-context';
import { Cell, RowHead } from '../tables/cells';
import { Row } from '../tables/table';
import { DateTime } from '../ui/date-time';
import { TextButton } from '../ui/text-link';

function Sees({ member }: { member: Member }) {
  if (!member.roles.includes('auditor')) return <>everything</>;
  return (
    <>
      what is signed{member.codes !== null && <> of {member.codes.join(', ')}</>}
      {member.until !== null && <>, until <DateTime value={member.until} /></>}
    </>
  );
}

interface MemberRowProps { member: Member; isLastOwner: boolean; onChoose: (to: 'change' | 'remove') => void }

export function MemberRow({ member, isLastOwner, onChoose }: MemberRowProps) {
  const { may, userId } = useOrganisation();
  const isSelf = member.id === userId;
  return (
    <Row>
      <RowHead className="min-w-48 [overflow-wrap:anywhere]">{member.email}{isSelf && <span className="text-graphite"> (you)</span>}</RowHead>
      <Cell>{member.roles.join(', ')}</Cell>
      <Cell><DateTime value={member.since} /></Cell>
      <Cell><Sees member={member} /></Cell>
      <Cell className="whitespace-nowrap">
        {may('people.manage') && <TextButton aria-label={`Change roles of ${member.email}`} onClick={() => onChoose('change')}>Change roles</TextButton>}
        {isLastOwner
          ? <span className="ml-4 text-note text-graphite">only owner: stays</span>
          : (may('people.manage') || isSelf) && (
            <TextButton className="ml-4" aria-label={isSelf ? 'Leave the organisation' : `Remove ${member.email}`} onClick={() => onChoose('remove')}>{isSelf ? 'Leave' : 'Remove'}</TextButton>
          )}
      </Cell>
    </Row>
  );
}
