import type { ContractShape } from '@/lib/domain/api/contract';
import {
  acceptInvitationContract, createInvitationContract, listInvitationsContract, lookUpInvitationContract, resendInvitationContract, revokeInvitationContract,
} from '@/lib/domain/invitations/schema';
import { listMailsContract, resendMailContract } from '@/lib/domain/mail/schema';
import { listMembersContract, removeMemberContract, updateMemberContract } from '@/lib/domain/members/schema';
import { getOrganisationContract, updateOrganisationContract } from '@/lib/domain/organisation/schema';
import {
  changePasswordContract, confirmResetContract, getMailPreferencesContract, requestResetContract, updateMailPreferencesContract,
} from '@/lib/domain/people/account-schema';
import { createOrganisationContract } from '@/lib/domain/people/schema';
import { ifMatch, type Sent } from '../support/api';

/** What the calls about people are made on. */
export interface PeopleGround { invitation: string; mail: string; member: string }

interface PeopleRow { contract: ContractShape; needs: 'nothing' | 'session' | 'people' | 'members'; sent: (ground: PeopleGround) => Sent }

const nothing = () => ({});
const invitation = (ground: PeopleGround) => ({ params: { id: ground.invitation } });
const member = (ground: PeopleGround) => ({ params: { id: ground.member } });

/** `people`: owners. `members`: every role that reads. Neither is for tokens. */
export const peopleRows: PeopleRow[] = [
  { contract: requestResetContract, needs: 'nothing', sent: nothing },
  { contract: confirmResetContract, needs: 'nothing', sent: nothing },
  { contract: lookUpInvitationContract, needs: 'nothing', sent: nothing },
  { contract: acceptInvitationContract, needs: 'nothing', sent: nothing },
  { contract: changePasswordContract, needs: 'session', sent: nothing },
  { contract: getMailPreferencesContract, needs: 'session', sent: nothing },
  { contract: updateMailPreferencesContract, needs: 'session', sent: nothing },
  { contract: createOrganisationContract, needs: 'session', sent: nothing },

  { contract: getOrganisationContract, needs: 'members', sent: nothing },
  { contract: updateOrganisationContract, needs: 'people', sent: () => ({ body: { name: 'Role Works' }, ...ifMatch(1) }) },
  { contract: listMembersContract, needs: 'members', sent: nothing },
  { contract: updateMemberContract, needs: 'people', sent: (ground) => ({ ...member(ground), body: { roles: ['engineer'] } }) },
  { contract: removeMemberContract, needs: 'people', sent: member },
  { contract: createInvitationContract, needs: 'people', sent: () => ({ body: { email: 'matrix@northmoor.example', roles: ['engineer'] } }) },
  { contract: listInvitationsContract, needs: 'members', sent: nothing },
  { contract: resendInvitationContract, needs: 'people', sent: invitation },
  { contract: revokeInvitationContract, needs: 'people', sent: invitation },
  { contract: listMailsContract, needs: 'people', sent: nothing },
  { contract: resendMailContract, needs: 'people', sent: ({ mail }) => ({ params: { id: mail } }) },
];
