import fs from 'node:fs';
import path from 'node:path';
import { root } from './places.mjs';

const source = 'lib/readers/table/table-rows/read-rows.ts';
const target = 'lib/readers/table/table-rows.generated.ts';

/** @returns {Promise<string>} the WebAssembly module, in base64 */
async function compile() {
  // Loaded here: this file is read before npm has installed anything.
  const { default: asc } = await import('assemblyscript/asc');
  const outFile = 'read-rows.wasm';
  let compiled = Buffer.alloc(0);
  const { error, stderr } = await asc.main(
    [source, '--outFile', outFile, '-O3', '--noAssert', '--runtime', 'stub', '--importMemory', '--baseDir', root],
    { writeFile: (name, contents) => void (name === outFile && (compiled = Buffer.from(contents))) },
  );
  if (error) throw new Error(`${source} does not compile:\n${stderr.toString()}`);
  return compiled.toString('base64');
}

/**
 * Compares the compiled reader of rows with its source, or writes it anew.
 * @param {boolean} isWritten
 */
export async function checkTableRows(isWritten) {
  const file = path.join(root, target);
  const content = `// Written by “npm run validate -- --write-parser” from ${source}.\nexport const tableRowsModule = '${await compile()}';\n`;
  if (isWritten) fs.writeFileSync(file, content);
  else if (!fs.existsSync(file) || fs.readFileSync(file, 'utf8') !== content) {
    throw new Error(`${target} is not what ${source} compiles to. Write it: npm run validate -- --write-parser`);
  }
}
