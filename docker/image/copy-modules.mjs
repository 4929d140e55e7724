import fs from 'node:fs';
import { builtinModules } from 'node:module';
import path from 'node:path';
import { root } from '../local/places.mjs';

/** @param {string} specifier @returns {string | null} the package that holds it, null for Node's own */
function packageOf(specifier) {
  const parts = specifier.split('/');
  const name = specifier.startsWith('@') ? parts.slice(0, 2).join('/') : (parts[0] ?? '');
  return specifier.startsWith('node:') || specifier.startsWith('.') || builtinModules.includes(name) ? null : name;
}

/** @param {string} name @param {string} from a folder @returns {string | null} where Node would find the package */
function findPackage(name, from) {
  for (let folder = from; ; folder = path.dirname(folder)) {
    const place = path.join(folder, 'node_modules', name);
    if (fs.existsSync(path.join(place, 'package.json'))) return place;
    if (folder === root) return null;
  }
}

/**
 * Copies the packages that are imported, and those they need, to where Node finds them: an image holds no others.
 * @param {string[]} specifiers @param {string} target a folder that gets node_modules
 */
export function copyModules(specifiers, target) {
  const done = new Set();
  /** @param {string} name @param {string} from @param {boolean} isNeeded */
  function take(name, from, isNeeded) {
    const place = findPackage(name, from);
    if (place === null) {
      if (isNeeded) throw new Error(`${name}, needed in ${path.relative(root, from)}, is not installed.`);
      return;
    }
    if (done.has(place)) return;
    done.add(place);
    const isOwn = (/** @type {string} */ file) => path.basename(file) !== 'node_modules' && !/\.(map|md|d\.[cm]?ts)$/.test(file);
    fs.cpSync(place, path.join(target, path.relative(root, place)), { recursive: true, filter: (file) => file === place || isOwn(file) });
    const { dependencies = {}, optionalDependencies = {}, peerDependencies = {}, peerDependenciesMeta = {} } = JSON.parse(
      fs.readFileSync(path.join(place, 'package.json'), 'utf8'),
    );
    for (const needed of Object.keys(dependencies)) take(needed, place, optionalDependencies[needed] === undefined);
    for (const wanted of Object.keys(optionalDependencies)) take(wanted, place, false);
    for (const peer of Object.keys(peerDependencies)) if (!peerDependenciesMeta[peer]?.optional) take(peer, place, false);
  }
  for (const name of new Set(specifiers.map(packageOf))) if (name !== null) take(name, root, true);
}
