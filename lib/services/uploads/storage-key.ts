/** Where a file lies in storage: the organisation first, so that one organisation's files can be listed and removed. */
export function storageKey(organisationId: string, studyId: string, uploadId: string): string {
  return `${organisationId}/${studyId}/${uploadId}`;
}

const uuid = '[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}';
const uploadKey = new RegExp(`^${uuid}/${uuid}/${uuid}$`);

/** Whether a key is one that an upload has; whatever else lies there is not for uploads to remove. */
export function isUploadKey(key: string): boolean {
  return uploadKey.test(key);
}
