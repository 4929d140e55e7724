const units = [['day', 86_400], ['hour', 3600], ['minute', 60]] as const;

/** A time in words, in the largest unit of which there is one: 3 minutes. */
export function waitWords(seconds: number): string {
  const [unit, size] = units.find(([, each]) => seconds >= each) ?? (['second', 1] as const);
  const count = Math.floor(seconds / size);
  return `${count} ${unit}${count === 1 ? '' : 's'}`;
}
