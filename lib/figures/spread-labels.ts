/**
 * Moves labels apart so that neighbours are at least `gap` from each other and all lie within [top, bottom], as near to
 * where they belong as that allows. Positions come back in the order given. Where they cannot all fit they share the room.
 */
export function spreadLabels(wanted: readonly number[], gap: number, top: number, bottom: number): number[] {
  if (wanted.length === 0) return [];
  const step = wanted.length > 1 ? Math.min(gap, (bottom - top) / (wanted.length - 1)) : gap;
  const order = wanted.map((_, index) => index).sort((a, b) => (wanted[a] ?? 0) - (wanted[b] ?? 0));
  // Groups that touch are centred on the mean of what they wanted, and merged until none overlap.
  const groups: { members: number[]; start: number }[] = [];
  const startOf = (members: number[]) => {
    const offset = members.reduce((sum, member, place) => sum + (wanted[member] ?? 0) - place * step, 0) / members.length;
    return Math.min(Math.max(offset, top), bottom - (members.length - 1) * step);
  };
  for (const index of order) {
    let group = { members: [index], start: startOf([index]) };
    for (let last = groups.at(-1); last && last.start + last.members.length * step > group.start; last = groups.at(-1)) {
      groups.pop();
      const members = [...last.members, ...group.members];
      group = { members, start: startOf(members) };
    }
    groups.push(group);
  }
  const placed = new Array<number>(wanted.length).fill(0);
  for (const { members, start } of groups) members.forEach((member, place) => { placed[member] = start + place * step; });
  return placed;
}
