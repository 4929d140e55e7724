import { assessContract } from '@/lib/domain/assessment/quick-schema';
import { healthContract, metricsContract, openApiContract, readyContract } from '@/lib/domain/api/service-schema';
import type { ContractShape } from '@/lib/domain/api/contract';
import { createCaseContract, getCaseContract, listCasesContract, putColumnsContract, updateCaseContract } from '@/lib/domain/cases/schema';
import {
  createCodeContract, createReleaseContract, getCodeContract, listCodesContract, listReleasesContract, updateReleaseContract,
} from '@/lib/domain/codes/schema';
import { createInvitationContract } from '@/lib/domain/invitations/schema';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { meContract, signInContract, signOutContract, signOutEverywhereContract, signUpContract } from '@/lib/domain/people/schema';
import { createProblemContract, getProblemContract, listProblemsContract, updateProblemContract } from '@/lib/domain/problems/schema';
import {
  addGridContract, assessStudyContract, createStudyContract, getEventsContract, getGridResultContract, getOutcomeContract, getOutcomeXmlContract,
  getStudyContract, listStudiesContract, reviseStudyContract, updateGridContract,
} from '@/lib/domain/studies/schema';
import { getGridMapContract } from '@/lib/domain/studies/map-schema';
import { listRechecksContract, requestRecheckContract } from '@/lib/domain/studies/recheck-schema';
import { getStorageContract } from '@/lib/domain/storage/schema';
import { createTokenContract, deleteTokenContract, listTokensContract } from '@/lib/domain/tokens/schema';
import {
  completeUploadContract, deleteUploadContract, getUploadContract, previewContract, putDataContract, signPartsContract, startUploadContract,
} from '@/lib/domain/uploads/schema';
import { ifMatch, ok, type Sent } from '../support/api';
import { addMember, makeToken, newEmail, signUp, type Person } from '../support/people';
import { heatProblem, makeWork, orderCase, type Work } from '../support/work';
import { peopleRows, type PeopleGround } from './people-rows';

/** What the calls of the matrix are made on: work of one organisation, and a token of its engineer. */
export interface Ground extends PeopleGround { person: Person; work: Work; study: string; upload: string; token: string }

export async function layGround(): Promise<Ground> {
  const person = await signUp('Role Works');
  const work = await makeWork(person);
  const grids = [8, 16].map((n) => ({ label: `n${n}`, h: 1 / n }));
  const study = await ok(person, createStudyContract, { body: { case: work.case.slug, release: work.release.version, grids } });
  const { upload } = await ok(person, startUploadContract, { params: { id: study.id, label: 'n8' }, body: { filename: 'a.csv', bytes: 100 } });
  await makeToken(person, { scopes: ['read'] });
  const { items: [token] } = await ok(person, listTokensContract, {});
  const invitation = await ok(person, createInvitationContract, { body: { email: newEmail('guest'), roles: ['engineer'] } });
  const member = await addMember(person.at, ['engineer']);
  const people = { invitation: invitation.id, mail: invitation.mail?.id ?? '', member: member.userId };
  return { ...people, person, work, study: study.id, upload, token: token?.id ?? '' };
}

/** Who may: everybody; everybody signed in; members who read; engineers; engineers and owners for themselves; owners; members, without tokens. */
type Needs = 'nothing' | 'session' | 'read' | 'write' | 'tokens' | 'people' | 'members';

export interface RoleRow {
  contract: ContractShape;
  needs: Needs;
  sent: (ground: Ground) => Sent;
  /** What a token limited to another code is told: not there, not allowed, or an answer that leaves the rest out. */
  otherCode?: 404 | 403 | 'answer';
}

const code = ({ work }: Ground) => ({ params: { code: work.code.id } });
const release = ({ work }: Ground) => ({ params: { code: work.code.id, version: work.release.version } });
const problem = ({ work }: Ground) => ({ params: { problem: work.problem.id } });
const oneCase = ({ work }: Ground) => ({ params: { case: work.case.id } });
const study = (ground: Ground) => ({ params: { id: ground.study } });
const grid = (ground: Ground) => ({ params: { id: ground.study, label: 'n8' } });
const upload = (ground: Ground) => ({ params: { id: ground.upload } });
const nothing = () => ({});
const read = (contract: ContractShape, sent: RoleRow['sent'], otherCode: RoleRow['otherCode'] = 404): RoleRow => ({ contract, needs: 'read', sent, otherCode });
const write = (contract: ContractShape, sent: RoleRow['sent'], otherCode: RoleRow['otherCode'] = 404): RoleRow => ({ contract, needs: 'write', sent, otherCode });

/** One row for every call of the API: who may, and what is sent. A new route needs its row here. */
export const roleRows: RoleRow[] = [
  ...peopleRows,
  { contract: signUpContract, needs: 'nothing', sent: nothing },
  { contract: signInContract, needs: 'nothing', sent: nothing },
  { contract: assessContract, needs: 'nothing', sent: nothing },
  { contract: healthContract, needs: 'nothing', sent: nothing },
  { contract: readyContract, needs: 'nothing', sent: nothing },
  { contract: metricsContract, needs: 'nothing', sent: nothing },
  { contract: openApiContract, needs: 'nothing', sent: nothing },
  { contract: meContract, needs: 'session', sent: nothing },
  { contract: signOutContract, needs: 'session', sent: nothing },
  { contract: signOutEverywhereContract, needs: 'session', sent: nothing },

  { contract: createTokenContract, needs: 'tokens', sent: () => ({ body: { name: 'matrix', scopes: ['read'] } }) },
  { contract: listTokensContract, needs: 'tokens', sent: nothing },
  { contract: deleteTokenContract, needs: 'tokens', sent: ({ token }) => ({ params: { id: token } }) },

  write(createCodeContract, () => ({ body: { name: 'Another' } }), 403),
  read(listCodesContract, nothing, 'answer'),
  read(getCodeContract, code),
  write(createReleaseContract, (ground) => ({ ...code(ground), body: { version: '7.0.0' } })),
  read(listReleasesContract, code),
  write(updateReleaseContract, (ground) => ({ ...release(ground), body: { state: 'current' }, ...ifMatch(1) })),
  read(getMatrixContract, code),

  write(createProblemContract, () => ({ body: { ...heatProblem, name: 'Another' } }), 403),
  read(listProblemsContract, nothing, 'answer'),
  read(getProblemContract, problem, 'answer'),
  write(updateProblemContract, (ground) => ({ ...problem(ground), body: { name: 'Renamed' }, ...ifMatch(1) }), 403),

  write(createCaseContract, ({ work }) => ({ body: { ...orderCase, name: 'Another', code: work.code.id, problem: work.problem.id } })),
  read(listCasesContract, nothing, 'answer'),
  read(getCaseContract, oneCase),
  write(updateCaseContract, (ground) => ({ ...oneCase(ground), body: { name: 'Renamed' }, ...ifMatch(1) })),
  write(putColumnsContract, (ground) => ({ ...oneCase(ground), body: { x: 'x', y: 'y', weight: null, fields: {} } })),

  write(createStudyContract, ({ work }) => ({ body: { case: work.case.id, release: work.release.id, grids: [{ label: 'n8', h: 0.125 }] } })),
  read(listStudiesContract, nothing, 'answer'),
  read(getStudyContract, study),
  write(addGridContract, (ground) => ({ ...study(ground), body: { label: 'n32', h: 1 / 32 } })),
  write(updateGridContract, (ground) => ({ params: { id: ground.study, label: 'n16' }, body: { run: { platform: 'two cores' } }, ...ifMatch(1) })),
  read(getOutcomeContract, study),
  read(getOutcomeXmlContract, study),
  read(getEventsContract, study),
  write(startUploadContract, (ground) => ({ params: { id: ground.study, label: 'n16' }, body: { filename: 'b.csv', bytes: 100 } })),
  read(getUploadContract, upload),
  read(previewContract, upload),
  write(signPartsContract, (ground) => ({ ...upload(ground), body: { numbers: [1] } })),
  write(completeUploadContract, (ground) => ({ ...upload(ground), body: { parts: [{ number: 1, etag: '"none"' }] } })),
  write(deleteUploadContract, upload),
  write(putDataContract, (ground) => ({ ...grid(ground), body: 'x,y,T\n', headers: { 'content-type': 'text/csv' } })),
  read(getGridResultContract, grid),
  read(getGridMapContract, (ground) => ({ params: { ...grid(ground).params, field: 'T' } })),
  read(getStorageContract, nothing, 'answer'),
  write(reviseStudyContract, study),
  write(assessStudyContract, study),
  read(requestRecheckContract, study), read(listRechecksContract, study),
];
