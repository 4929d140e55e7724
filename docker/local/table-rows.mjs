import fs from 'node:fs';
import path from 'node:path';
import { root } from './places.mjs';

const folder = 'lib/readers/table/table-rows';
const sources = ['read-rows.ts', 'trigonometry.ts', 'exponential.ts', 'column-steps.ts', 'norm-sums.ts'].map((name) => `${folder}/${name}`);
const target = 'lib/readers/table/table-rows.generated.ts';

/** @returns {Promise<string>} the WebAssembly module, in base64 */
async function compile() {
  // Loaded here: this file is read before npm has installed anything.
  const { default: asc } = await import('assemblyscript/asc');
  const outFile = 'read-rows.wasm';
  let compiled = Buffer.alloc(0);
  const { error, stderr } = await asc.main(
    [
      ...sources, '--outFile', outFile, '-O3', '--noAssert', '--runtime', 'stub', '--baseDir', root, '--enable', 'simd', '--enable', 'threads',
      '--importMemory', '--initialMemory', '1', '--sharedMemory', '--maximumMemory', '65536',
    ],
    { writeFile: (name, contents) => void (name === outFile && (compiled = Buffer.from(contents))) },
  );
  if (error) throw new Error(`${folder} does not compile:\n${stderr.toString()}`);
  return compiled.toString('base64');
}

/**
 * Compares the compiled reader of rows with its source, or writes it anew.
 * @param {boolean} isWritten
 */
export async function checkTableRows(isWritten) {
  const file = path.join(root, target);
  const content = `// Written by “npm run validate -- --write-parser” from ${folder}/.\nexport const tableRowsModule = '${await compile()}';\n`;
  if (isWritten) fs.writeFileSync(file, content);
  else if (!fs.existsSync(file) || fs.readFileSync(file, 'utf8') !== content) {
    throw new Error(`${target} is not what ${folder}/ compiles to. Write it: npm run validate -- --write-parser`);
  }
}
