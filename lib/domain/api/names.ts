import { z } from 'zod';

export const nameSchema = z.string().trim().min(1).max(120).meta({ description: 'A name, 1 to 120 characters.' });
export const slugSchema = z
  .string()
  // “new” is the page where one is made.
  .regex(/^(?!new$)[a-z0-9](?:[a-z0-9-]{0,58}[a-z0-9])?$/, 'Expected lower-case letters, digits and hyphens, such as heat-2d.')
  .meta({ description: 'Lower-case letters, digits and hyphens; unique in the organisation; not “new”.' });
export const labelSchema = z
  .string()
  .regex(/^[A-Za-z0-9][A-Za-z0-9._-]{0,39}$/, 'Expected letters, digits, point, underscore or hyphen, at most 40, such as n64.')
  .meta({ description: 'A label in paths: letters, digits, point, underscore, hyphen.' });
export const timestampSchema = z.iso.datetime().meta({ description: 'ISO 8601, UTC.' });

/** What a slug is made from where none is given. */
export function slugFrom(name: string): string {
  const plain = name.normalize('NFKD').replace(/[\u0300-\u036f]/g, '').toLowerCase();
  const slug = plain.replace(/[^a-z0-9]+/g, '-').replace(/^-+|-+$/g, '').slice(0, 50).replace(/-+$/, '');
  if (slug === '') return 'unnamed';
  return slug === 'new' ? 'new-1' : slug;
}
