import { AppError } from '@/lib/errors';

/** Turns a broken unique constraint into an answer a person can act on; anything else goes on as it is. */
export async function refuseDuplicate<T>(constraint: string, path: string, detail: string, work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    const fault = error as { code?: unknown; constraint?: unknown };
    if (fault.code !== '23505' || fault.constraint !== constraint) throw error;
    throw new AppError('already-exists', detail, { cause: error, fields: [{ path, message: detail }] });
  }
}
