import { readFileSync } from 'node:fs';

/** Reads a file of reference values; the caller states its shape. */
export function readReference<Shape>(name: string): Shape {
  return JSON.parse(readFileSync(new URL(`../../fixtures/reference/${name}`, import.meta.url), 'utf8')) as Shape;
}
