import type { RejectionReason } from '../domain/uploads/rejection';

/** A file that cannot be taken, with every reason found in it. */
export class RejectedFile extends Error {
  constructor(readonly reasons: RejectionReason[]) {
    super(`the file is rejected: ${reasons.map((reason) => reason.code).join(', ')}`);
    this.name = 'RejectedFile';
  }
}
