// Writes a table as a solver would: node tests/bench/generate.mjs CELLS [--scattered] > FILE
import { once } from 'node:events';

const lines = 512;

/** Numbers from 0 to 1, the same in every run (G. Marsaglia, Xorshift RNGs, 2003). */
function createRandom() {
  let state = 2_463_534_242 | 0;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
}

/** What the norms of a file are taken against, as print-norms.ts and norms-pandas.py state it. @param {number[]} point */
function exactFields([x, y, z]) {
  const { sin, cos, PI: pi } = Math;
  return [
    1 + 0.15 * sin(0.75 * pi * x) - 0.1 * cos(pi * y) + 0.08 * sin(1.25 * pi * z),
    800 + 50 * sin(1.5 * pi * x) - 30 * cos(0.6 * pi * y) + 25 * cos(0.5 * pi * z),
    800 - 75 * cos(0.5 * pi * x) + 40 * sin(0.667 * pi * y) - 35 * sin(1.3 * pi * z),
    800 + 15 * sin(0.33 * pi * x) - 25 * sin(1.5 * pi * y) + 35 * cos(pi * z),
    1e5 + 2e4 * cos(2 * pi * x) + 5e4 * sin(pi * y) - 1e4 * cos(0.33 * pi * z),
  ];
}

const sizes = [0.7, 300, 250, 200, 9e4];

/**
 * Rows of a cube of cells with errors that fall as h²; scattered, no two rows share a coordinate.
 * @param {number} cells per direction @param {boolean} isScattered
 */
function* rowsOf(cells, isScattered) {
  const random = createRandom();
  const h = 1 / cells;
  const place = (/** @type {number} */ index) => (index + 0.5 + (isScattered ? 0.5 * (random() - 0.5) : 0)) * h;
  for (let k = 0; k < cells; k += 1) {
    for (let j = 0; j < cells; j += 1) {
      for (let i = 0; i < cells; i += 1) {
        const point = [place(i), place(j), place(k)];
        const shape = h * h * (1 + (point[0] * point[1] * point[2]) / 2);
        const fields = exactFields(point).map((value, at) => value + sizes[at] * shape);
        yield [...point, h ** 3, ...fields].join(',');
      }
    }
  }
}

const cells = Number(process.argv[2]);
if (!(Number.isInteger(cells) && cells > 0)) {
  console.error('usage: node tests/bench/generate.mjs CELLS [--scattered] > FILE');
  process.exit(2);
}
let text = 'x,y,z,volume,rho,u,v,w,p\n';
let held = 0;
for (const row of rowsOf(cells, process.argv.includes('--scattered'))) {
  text += `${row}\n`;
  held += 1;
  if (held < lines) continue;
  if (!process.stdout.write(text)) await once(process.stdout, 'drain');
  text = '';
  held = 0;
}
process.stdout.write(text);
