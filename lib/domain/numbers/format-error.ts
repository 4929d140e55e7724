import { noBreakSpace, printDecimal } from './signs';

const superscripts: Record<string, string> = {
  '-': '⁻', 0: '⁰', 1: '¹', 2: '²', 3: '³', 4: '⁴', 5: '⁵', 6: '⁶', 7: '⁷', 8: '⁸', 9: '⁹',
};

/** A number as a.bc × 10ⁿ in parts, for a page that sets the exponent itself, and as plain text. */
interface ScientificNumber { mantissa: string; exponent: number; text: string }

/** An error with three digits, always as a power of ten, so that a column never mixes forms; 0 is "0". */
export function formatError(value: number, digits = 3): ScientificNumber {
  if (value === 0) return { mantissa: '0', exponent: 0, text: '0' };
  const [mantissa = '', power = '0'] = value.toExponential(digits - 1).split('e');
  const exponent = Number(power);
  const raised = [...String(exponent)].map((sign) => superscripts[sign] ?? sign).join('');
  const printed = printDecimal(mantissa);
  return { mantissa: printed, exponent, text: `${printed}${noBreakSpace}×${noBreakSpace}10${raised}` };
}
