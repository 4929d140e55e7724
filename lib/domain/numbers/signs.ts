/** No-break space, round the × of a power of ten. */
export const noBreakSpace = '\u00A0';
/** Narrow no-break space, between thousands and before the percent sign. */
export const thinSpace = '\u202F';
const minus = '\u2212';

/** A plain decimal text with the minus sign of print and thousands apart: "-12345.6" as "−12 345.6". */
export function printDecimal(text: string): string {
  const [whole = '', fraction] = text.replace('-', minus).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, thinSpace);
  return fraction === undefined ? grouped : `${grouped}.${fraction}`;
}
