/** A typed number; nothing where the field is empty, and the text itself where it is no number, so that a fault can quote it. */
export function typedNumber(text: string): number | string | undefined {
  const trimmed = text.trim();
  if (trimmed === '') return undefined;
  const value = Number(trimmed);
  return Number.isFinite(value) ? value : trimmed;
}
