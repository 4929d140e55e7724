/** A table of T on n × n cells of the unit square, off the exact solution of the heat problem by 0.3·h². */
export function heatTable(n: number, { header = 'x,y,w,T', error = (h: number) => 0.3 * h * h }: { header?: string; error?: (h: number) => number } = {}): Buffer {
  const h = 1 / n;
  const rows: string[] = header === '' ? [] : [header];
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < n; j += 1) {
      const [x, y] = [(i + 0.5) * h, (j + 0.5) * h];
      const exact = Math.sin(Math.PI * x) * Math.sin(Math.PI * y) + 0.5 * x;
      rows.push([x, y, h * h, exact + error(h) * (1 + 0.5 * Math.sin(Math.PI * x))].map(String).join(','));
    }
  }
  return Buffer.from(`${rows.join('\n')}\n`);
}

export const heatSizes = [8, 16, 32, 64];
