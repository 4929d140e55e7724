import type { Letter } from './letter';

/** A letter as plain text: nothing is said in the HTML part that is not here. */
export function letterText({ paragraphs, facts, action, note }: Letter): string {
  const width = Math.max(0, ...facts.map(({ name }) => name.length));
  const parts = [
    ...paragraphs,
    ...(facts.length > 0 ? [facts.map(({ name, value }) => `${`${name}:`.padEnd(width + 2)}${value}`).join('\n')] : []),
    ...(action ? [`${action.label}:\n${action.url}`] : []),
    `-- \n${note}`,
  ];
  return `${parts.join('\n\n')}\n`;
}
