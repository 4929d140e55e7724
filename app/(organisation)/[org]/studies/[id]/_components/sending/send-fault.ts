/**
 * Why a file is not sent. `line`: storage or server could not be reached often enough, trying again may do; `changed`: the
 * file on disk is no longer the one chosen; `gone`: the upload was given up or replaced; `refused`: the server says why.
 */
export class SendFault extends Error {
  constructor(readonly kind: 'line' | 'changed' | 'gone' | 'refused', words: string) {
    super(words);
    this.name = 'SendFault';
  }
}

export const changedFile = (name: string) => new SendFault('changed', `${name} changed on disk while it was being sent. Choose it again once it is written.`);
