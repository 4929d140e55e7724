import { install } from './install.mjs';
import { onInterruption } from './interruption.mjs';
import { withLock } from './lock.mjs';
import { root } from './places.mjs';
import { run, stopRunning } from './processes.mjs';

const AT_ONCE = 2;
const onlyWritesSchema = process.argv.includes('--write-schema');
const onlyWritesParser = process.argv.includes('--write-parser');

/** @typedef {{ name: string, check: () => Promise<unknown> }} Step */

/** @param {string} script of package.json @returns {Step} */
const script = (script) => ({
  name: script.replace('check:', ''),
  check: () => run({ command: 'npm', args: ['run', '--silent', script], cwd: root }),
});

/** @returns {Promise<Step[]>} the slowest first */
async function listSteps() {
  // Loaded after npm has installed what they import.
  const { checkSchema } = await import('./schema.mjs');
  const { checkFiles } = await import('./file-rules.mjs');
  const { checkTableRows } = await import('./table-rows.mjs');
  const parser = { name: 'parser', check: () => checkTableRows(onlyWritesParser) };
  if (onlyWritesParser) return [parser];
  const schema = { name: 'schema', check: () => checkSchema(onlyWritesSchema) };
  if (onlyWritesSchema) return [schema];
  return [
    script('check:lint'),
    // A build writes the same generated types.
    { name: 'types', check: () => withLock('build', 'a build', script('check:types').check) },
    script('check:unused'),
    script('check:imports'),
    schema,
    parser,
    { name: 'files', check: checkFiles },
  ];
}

/** @param {Step} step @returns {Promise<boolean>} */
async function perform({ name, check }) {
  const start = performance.now();
  const took = () => `${((performance.now() - start) / 1000).toFixed(1)} s`;
  try {
    await check();
    console.log(`passed  ${name.padEnd(8)} ${took()}`);
    return true;
  } catch (error) {
    console.log(`FAILED  ${name.padEnd(8)} ${took()}\n${error instanceof Error ? error.message : error}\n`);
    return false;
  }
}

/** @returns {Promise<boolean>} */
async function validate() {
  await install('validate');
  return withLock('validate', 'another validation', async () => {
    const waiting = await listSteps();
    /** @type {boolean[]} */
    const results = [];
    const lanes = Array.from({ length: AT_ONCE }, async () => {
      for (let step = waiting.shift(); step; step = waiting.shift()) results.push(await perform(step));
    });
    await Promise.all(lanes);
    return results.every(Boolean);
  });
}

onInterruption(() => Promise.resolve(), null);

try {
  const isValid = await validate();
  process.exit(isValid ? 0 : 1);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  await stopRunning();
  process.exit(1);
}
