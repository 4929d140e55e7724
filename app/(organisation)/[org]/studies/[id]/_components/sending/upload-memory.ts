const keyOf = (upload: string) => `fourfold-upload-${upload}`;

/** Runs without storage as well: the browser then asks before it goes on with an upload of its own. */
function withStorage<T>(work: (storage: Storage) => T, otherwise: T): T {
  try {
    return work(localStorage);
  } catch {
    return otherwise;
  }
}

/** Remembers that this browser began the upload. */
export const rememberUpload = (upload: string): void => withStorage((storage) => storage.setItem(keyOf(upload), '1'), undefined);

export const forgetUpload = (upload: string): void => withStorage((storage) => storage.removeItem(keyOf(upload)), undefined);

export const isRemembered = (upload: string): boolean => withStorage((storage) => storage.getItem(keyOf(upload)) !== null, false);
