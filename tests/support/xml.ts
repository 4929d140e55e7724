/** Whether every tag is closed where it should be and every attribute and text is escaped; throws where not. */
export function checkWellFormed(text: string): void {
  if (!text.startsWith('<?xml version="1.0" encoding="UTF-8"?>\n')) throw new Error('There is no XML declaration.');
  const open: string[] = [];
  let rest = text.slice(text.indexOf('\n') + 1).trim();
  while (rest !== '') {
    const tag = /^<(\/)?([a-z]+)((?:\s+[a-z]+="(?:[^"<&]|&(?:amp|lt|gt|quot|apos|#\d+);)*")*)\s*(\/)?>/.exec(rest);
    if (tag) {
      const [, closes, name = '', , isEmpty] = tag;
      if (closes && open.pop() !== name) throw new Error(`</${name}> closes nothing.`);
      if (!closes && !isEmpty) open.push(name);
    }
    const taken = tag?.[0] ?? /^(?:[^<&]|&(?:amp|lt|gt|quot|apos|#\d+);)+/.exec(rest)?.[0];
    if (!taken) throw new Error(`Not XML: ${rest.slice(0, 60)}`);
    rest = rest.slice(taken.length);
  }
  if (open.length > 0) throw new Error(`Not closed: ${open.join(', ')}.`);
}
