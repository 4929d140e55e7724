/**
 * Puts the fonts of the interface into this folder: unchanged copies of the packaged files, and two small subsets with
 * the mathematical signs those files lack. Run with `node app/fonts/build-fonts.mjs` after a font package changes.
 */
import { copyFile, readFile, writeFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import subsetFont from 'subset-font';

const require = createRequire(import.meta.url);
const here = (name) => new URL(name, import.meta.url);

const copies = {
  'stix-two-text': require.resolve('@fontsource-variable/stix-two-text/package.json'),
  'source-sans-3': require.resolve('@fontsource-variable/source-sans-3/package.json'),
  'source-code-pro': require.resolve('@fontsource-variable/source-code-pro/package.json'),
};
const files = [
  'stix-two-text-latin-wght-normal', 'stix-two-text-latin-wght-italic', 'stix-two-text-latin-ext-wght-normal',
  'stix-two-text-greek-wght-normal', 'stix-two-text-greek-wght-italic',
  'source-sans-3-latin-wght-normal', 'source-sans-3-latin-wght-italic', 'source-sans-3-latin-ext-wght-normal',
  'source-sans-3-greek-wght-normal',
  'source-code-pro-latin-wght-normal',
];
for (const [name, packageFile] of Object.entries(copies)) {
  for (const file of files.filter((each) => each.startsWith(name))) {
    await copyFile(packageFile.replace('package.json', `files/${file}.woff2`), here(`${file}.woff2`));
  }
  await copyFile(packageFile.replace('package.json', 'LICENSE'), here(`licences/${name}.txt`));
}

const range = (from, to) => Array.from({ length: to - from + 1 }, (_, i) => String.fromCodePoint(from + i)).join('');
const signs = {
  serif: '‖′″ⁿ←↑→↓↔⇒' + '∂∆∇∈∏∑−∓√∝∞∫≈≠≡≤≥≪≫⋅⋯',
  sans: '‖′″ⁿ' + range(0x2190, 0x22ff),
};
const sources = {
  serif: require.resolve('@fontsource/stix-two-math/files/stix-two-math-latin-400-normal.woff2'),
  sans: require.resolve('@expo-google-fonts/source-sans-3/400Regular/SourceSans3_400Regular.ttf'),
};
for (const kind of ['serif', 'sans']) {
  const subset = await subsetFont(await readFile(sources[kind]), signs[kind], { targetFormat: 'woff2' });
  await writeFile(here(`fourfold-signs-${kind}.woff2`), subset);
}
await copyFile(require.resolve('@fontsource/stix-two-math/LICENSE'), here('licences/fourfold-signs-serif.txt'));
await copyFile(require.resolve('@expo-google-fonts/source-sans-3/LICENSE_FONT'), here('licences/fourfold-signs-sans.txt'));
