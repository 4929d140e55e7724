import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The repository's root folder. */
export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');

/** Everything the local commands write lies in this one git-ignored folder. */
export const stateFolder = path.join(root, '.fourfold');

/** @param {string} name of an executable installed by npm */
export const npmBinary = (name) => path.join(root, 'node_modules/.bin', name);
