/** A moment as a mail tells it: the reader's zone is not known, so it is Coordinated Universal Time and says so. */
export function dateWords(iso: string): string {
  const [day, time] = iso.split('T');
  return `${day ?? ''} ${(time ?? '').slice(0, 5)} UTC`;
}
