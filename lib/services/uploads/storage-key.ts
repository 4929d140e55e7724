/** Where a file lies in storage: the organisation first, so that one organisation's files can be listed and removed. */
export function storageKey(organisationId: string, studyId: string, uploadId: string): string {
  return `${organisationId}/${studyId}/${uploadId}`;
}
