import type { TextRun } from './scene';

const thinSpace = '\u202f';

/** A number on a linear axis: plain decimals while they stay short, else a power of ten. */
export function axisNumber(value: number, decimals: number): TextRun[] {
  const size = Math.abs(value);
  if (size === 0 || (decimals <= 6 && size < 1e7)) {
    const [whole = '', fraction] = (Math.round(value * 10 ** decimals) === 0 ? 0 : value).toFixed(decimals).split('.');
    const grouped = whole.replace('-', '−').replace(/\B(?=(\d{3})+$)/g, thinSpace);
    return [{ text: fraction === undefined ? grouped : `${grouped}.${fraction}`, face: 'sans' }];
  }
  const power = Math.floor(Math.log10(size));
  const [mantissa = '', exponent = ''] = value.toExponential(Math.min(12, Math.max(0, power + decimals))).replaceAll('-', '−').split('e');
  return [{ text: `${mantissa}\u00a0×\u00a010`, face: 'sans' }, { text: exponent.replace('+', ''), face: 'exponent' }];
}
