/** A time to come, in the unit a person would say: "8 s", "3 min", "1 h 20 min". */
export function formatSeconds(seconds: number): string {
  if (seconds < 60) return `${Math.max(1, Math.ceil(seconds))}\u00a0s`;
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return `${minutes}\u00a0min`;
  return `${Math.floor(minutes / 60)}\u00a0h ${minutes % 60}\u00a0min`;
}
