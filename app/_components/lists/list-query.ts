export type SearchParams = Promise<Record<string, string | string[] | undefined>>;

/** The pages of a list hold 50; the cursor of a page stands in its address. */
const pageLength = 50;

/** One member of an address, where it is there once. */
export function single(value: string | string[] | undefined): string | undefined {
  return typeof value === 'string' && value !== '' ? value : undefined;
}

export function listQuery(cursor: string | undefined): { limit: number; cursor?: string } {
  return cursor === undefined ? { limit: pageLength } : { limit: pageLength, cursor };
}
