import { Fragment } from 'react';
import { NormSymbol, Sci, Sym } from './symbols';

interface FormulaTextProps {
  text: string;
  /** Names set as variables where they stand as words of their own, such as the fields of a study. */
  symbols?: readonly string[];
}

const norms = { L1: 'L1', L2: 'L2', 'L∞': 'Linf', H1: 'H1' } as const;
const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹⁻';
const scientific = /^([−-]?\d+(?:\.\d+)?)\s×\s10([⁰¹²³⁴⁵⁶⁷⁸⁹⁻]+)$/u;
const plainExponent = (raised: string) =>
  Number([...raised].map((sign) => (sign === '⁻' ? '-' : String(superscripts.indexOf(sign)))).join(''));

/** Sets a plain sentence: norms, named variables and powers of ten become proper symbols. */
export function FormulaText({ text, symbols = [] }: FormulaTextProps) {
  const parts = text.split(/([−-]?\d+(?:\.\d+)?\s×\s10[⁰¹²³⁴⁵⁶⁷⁸⁹⁻]+|(?<![\p{L}\p{N}_])[\p{L}_][\p{L}\p{N}_]*∞?)/u);
  return parts.map((part, index) => {
    const power = scientific.exec(part);
    let set = <>{part}</>;
    if (part in norms) set = <NormSymbol norm={norms[part as keyof typeof norms]} />;
    else if (power?.[1] && power[2]) set = <Sci mantissa={power[1]} exponent={plainExponent(power[2])} />;
    else if (symbols.includes(part)) set = <Sym>{part}</Sym>;
    return <Fragment key={index}>{set}</Fragment>;
  });
}
