const mebibyte = 1024 * 1024;
const smallest = 8 * mebibyte;
/** Storage takes at most 1000 parts; this leaves room. */
const mostParts = 900;

/** Bytes of each part but the last: 8 MiB, or more in whole MiB where the file would have more than 900 parts. */
export function partSizeOf(bytes: number): number {
  return Math.max(smallest, Math.ceil(bytes / mostParts / mebibyte) * mebibyte);
}

export function partCountOf(bytes: number, partSize: number): number {
  return Math.ceil(bytes / partSize);
}
