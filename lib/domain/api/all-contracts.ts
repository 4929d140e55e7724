import { assessContract } from '../assessment/quick-schema';
import { createCaseContract, getCaseContract, listCasesContract, putColumnsContract, updateCaseContract } from '../cases/schema';
import {
  createCodeContract, createReleaseContract, getCodeContract, listCodesContract, listReleasesContract, updateReleaseContract,
} from '../codes/schema';
import {
  acceptInvitationContract, createInvitationContract, listInvitationsContract, lookUpInvitationContract, resendInvitationContract, revokeInvitationContract,
} from '../invitations/schema';
import { listMailsContract, resendMailContract } from '../mail/schema';
import { getMatrixContract } from '../matrix/schema';
import { listMembersContract, removeMemberContract, updateMemberContract } from '../members/schema';
import { getOrganisationContract, updateOrganisationContract } from '../organisation/schema';
import {
  changePasswordContract, confirmResetContract, getMailPreferencesContract, requestResetContract, updateMailPreferencesContract,
} from '../people/account-schema';
import { createOrganisationContract, meContract, signInContract, signOutContract, signOutEverywhereContract, signUpContract } from '../people/schema';
import { createProblemContract, getProblemContract, listProblemsContract, updateProblemContract } from '../problems/schema';
import { getStorageContract } from '../storage/schema';
import { getGridMapContract } from '../studies/map-schema';
import { listRechecksContract, requestRecheckContract } from '../studies/recheck-schema';
import {
  addGridContract, assessStudyContract, createStudyContract, getEventsContract, getGridResultContract, getOutcomeContract, getOutcomeXmlContract,
  getStudyContract, listStudiesContract, reviseStudyContract, updateGridContract,
} from '../studies/schema';
import { createTokenContract, deleteTokenContract, listTokensContract } from '../tokens/schema';
import {
  completeUploadContract, deleteUploadContract, getUploadContract, previewContract, putDataContract, signPartsContract, startUploadContract,
} from '../uploads/schema';
import type { ContractShape } from './contract';
import { healthContract, metricsContract, openApiContract, readyContract } from './service-schema';

/** Every call there is, in the order they are told. */
export const allContracts: readonly ContractShape[] = [
  signUpContract, signInContract, signOutContract, signOutEverywhereContract, meContract,
  requestResetContract, confirmResetContract, changePasswordContract, getMailPreferencesContract, updateMailPreferencesContract,
  createOrganisationContract, getOrganisationContract, updateOrganisationContract, listMembersContract, updateMemberContract, removeMemberContract,
  createInvitationContract, listInvitationsContract, resendInvitationContract, revokeInvitationContract, lookUpInvitationContract, acceptInvitationContract,
  listMailsContract, resendMailContract,
  createTokenContract, listTokensContract, deleteTokenContract,
  createCodeContract, listCodesContract, getCodeContract,
  createReleaseContract, listReleasesContract, updateReleaseContract, getMatrixContract,
  createProblemContract, listProblemsContract, getProblemContract, updateProblemContract,
  createCaseContract, listCasesContract, getCaseContract, updateCaseContract, putColumnsContract,
  createStudyContract, listStudiesContract, getStudyContract, addGridContract, updateGridContract, reviseStudyContract, assessStudyContract, requestRecheckContract, listRechecksContract,
  getOutcomeContract, getOutcomeXmlContract, getEventsContract, getGridResultContract, getGridMapContract,
  putDataContract, startUploadContract, signPartsContract, completeUploadContract, getUploadContract, deleteUploadContract, previewContract, getStorageContract,
  assessContract, healthContract, readyContract, metricsContract, openApiContract,
];
