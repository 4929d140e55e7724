import { createElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { FormulaText } from '@/app/_components/ui/formula-text';

const words = (text: string, symbols?: string[]) => renderToStaticMarkup(createElement(FormulaText, { text, symbols }))
  .replaceAll(/ class="[^"]*"/g, '').replaceAll(/<\/?span>/g, '');

describe('FormulaText', () => {
  it('sets norms with an upright index', () => {
    expect(words('the L2 error and L∞.')).toBe('the <i>L</i><sub>2</sub> error and <i>L</i><sub>∞</sub>.');
  });

  it('sets named variables only where they stand as words', () => {
    expect(words('error of v over velocity', ['v'])).toBe('error of <i>v</i> over velocity');
  });

  it('raises powers of ten', () => {
    expect(words('is 2.20\u00a0×\u00a010⁻⁴ on grid 1')).toBe('is 2.20\u00a0×\u00a010<sup>−4</sup> on grid 1');
  });

  it('leaves plain text as it is', () => {
    expect(words('Grid 12 was left out, L3 too.')).toBe('Grid 12 was left out, L3 too.');
  });
});
