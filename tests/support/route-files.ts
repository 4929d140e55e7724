import { readdirSync, readFileSync } from 'node:fs';

const folder = new URL('../../app/api/v1/', import.meta.url);

/** Every call that a route file exports, such as `GET /codes/{code}`, read from the files themselves. */
export function listRouteCalls(): string[] {
  const files = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => /(^|\/)route\.ts$/.test(name) && !name.startsWith('[[...path]]'));
  return files.flatMap((file) => {
    const path = file.replace(/\/?route\.ts$/, '').replace(/\[(\w+)\]/g, '{$1}');
    const methods = [...readFileSync(new URL(file, folder), 'utf8').matchAll(/export (?:const|(?:async )?function) (GET|POST|PUT|PATCH|DELETE)\b/g)];
    if (methods.length === 0) throw new Error(`${file} exports no method.`);
    return methods.map(([, method]) => `${method} /${path}`);
  }).sort();
}
