import { z } from 'zod';

export const delimiterSchema = z.enum(['comma', 'semicolon', 'tab', 'white space']);
export type Delimiter = z.infer<typeof delimiterSchema>;

export const decimalMarkSchema = z.enum(['point', 'comma']);
export type DecimalMarkName = z.infer<typeof decimalMarkSchema>;

/** How text tables are written, as far as a person has said so; what is absent is found out from each file. */
export const givenDialectSchema = z.strictObject({
  delimiter: delimiterSchema.optional().meta({ description: 'What parts the columns.' }),
  hasHeader: z.boolean().optional().meta({ description: 'Whether the first line names the columns. Without names they are c1, c2 …' }),
  decimalMark: decimalMarkSchema.optional().meta({ description: 'A comma only where no comma parts the columns.' }),
});
export type GivenDialect = z.infer<typeof givenDialectSchema>;

/** Why no table can be written so; null where one can. */
export function refuseDialect({ delimiter, decimalMark }: GivenDialect): string | null {
  if (delimiter !== 'comma' || decimalMark !== 'comma') return null;
  return 'A comma cannot part the columns and be the decimal mark: “1,5,2,5” could be two numbers or four. Say what else parts the columns, or that the decimal mark is a point.';
}
