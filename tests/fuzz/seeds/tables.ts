import { oneOf, upTo, type Random } from '@/tests/support/random';

const names = ['x', 'y', 'w', 'u', 'mesh/x', 'u [m/s]', 'c1'];

/** A text table in one of the ways they are written. */
export function anyTable(random: Random): Buffer {
  const delimiter = oneOf(random, [',', ';', '\t', ' ', '   ']);
  const end = oneOf(random, ['\n', '\r\n', '\r']);
  const hasComma = delimiter !== ',' && random() < 0.3;
  const exponent = oneOf(random, ['e', 'E', 'D', 'd']);
  const number = () => {
    const text = (random() * 10 ** (upTo(random, 12) - 6) - 0.5).toExponential(upTo(random, 17)).replace('e', exponent);
    return hasComma ? text.replace('.', ',') : text;
  };
  const columns = ['x', 'y', 'w', 'u', ...names.slice(4, 4 + upTo(random, 3))];
  const rows = Array.from({ length: upTo(random, 60) }, () => columns.map((name) => (name === 'w' ? '1' : number())).join(delimiter));
  const header = oneOf(random, [columns.join(delimiter), `# ${columns.join(delimiter)}`, `"${columns.join(`"${delimiter}"`)}"`, '']);
  const comments = random() < 0.3 ? ['# made by a solver', '', '% 3'] : [];
  return Buffer.from(`${random() < 0.1 ? '\ufeff' : ''}${[...comments, header, ...rows].join(end)}${random() < 0.8 ? end : ''}`);
}
