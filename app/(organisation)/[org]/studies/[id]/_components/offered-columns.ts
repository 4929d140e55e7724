/** More choices than this nobody looks through, and a page of a dozen such lists grows slow. */
export const mostOffered = 300;
const mostAlike = 100;

/** Columns to choose from: all, or of very many the chosen one, those that have the name in theirs, and the first of the file. */
export function offeredColumns(header: readonly string[], name: string, chosen: string): string[] {
  const all = [...new Set(header)];
  if (all.length <= mostOffered) return all;
  const alike = all.filter((column) => column.toLowerCase().includes(name.toLowerCase())).slice(0, mostAlike);
  return [...new Set([...all.filter((column) => column === chosen), ...alike, ...all])].slice(0, mostOffered);
}
