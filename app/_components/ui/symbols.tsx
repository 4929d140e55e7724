import type { ReactNode } from 'react';
import type { SeriesNorm } from '@/lib/numerics/assessment';

/** A variable: serif italic, with an upright index where it has one. */
export function Sym({ children, index }: { children: ReactNode; index?: ReactNode }) {
  return (
    <span className="whitespace-nowrap font-serif">
      <i>{children}</i>
      {index !== undefined && <sub>{index}</sub>}
    </span>
  );
}

const indices = { L1: '1', L2: '2', Linf: '∞', H1: '1' };
const words = { value: 'value', energy: 'energy' } as const;

export function NormSymbol({ norm }: { norm: SeriesNorm }) {
  if (norm === 'value' || norm === 'energy') return <span>{words[norm]}</span>;
  return <Sym index={indices[norm]}>{norm === 'H1' ? 'H' : 'L'}</Sym>;
}

/** An error as `2.20 × 10⁻⁴`, kept on one line. */
export function Sci({ mantissa, exponent }: { mantissa: string; exponent: number }) {
  return (
    <span className="whitespace-nowrap">
      {mantissa}{'\u00a0×\u00a0'}10<sup>{exponent < 0 ? `−${-exponent}` : exponent}</sup>
    </span>
  );
}
