const units = ['B', 'kB', 'MB', 'GB', 'TB'] as const;

/** A size as storage counts it, in powers of 1000: "41 kB", "1.6 MB", "318 MB". */
export function formatBytes(bytes: number): string {
  let value = bytes;
  let place = 0;
  while (value >= 999.5 && place < units.length - 1) {
    value /= 1000;
    place += 1;
  }
  const printed = place > 0 && value < 9.95 ? value.toFixed(1) : String(Math.round(value));
  return `${printed}\u00a0${units[place] ?? 'B'}`;
}
