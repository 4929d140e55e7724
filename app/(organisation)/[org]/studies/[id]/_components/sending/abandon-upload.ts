import { callApi } from '@/app/_components/api/call-api';
import { deleteUploadContract } from '@/lib/domain/uploads/schema';
import { forgetUpload } from './upload-memory';

/** Frees an upload that nobody will go on with. */
export function abandonUpload(organisation: string, upload: string): void {
  forgetUpload(upload);
  // One that cannot be reached now is given up a day after it was last heard of.
  callApi(deleteUploadContract, { organisation, params: { id: upload } }).catch(() => undefined);
}
