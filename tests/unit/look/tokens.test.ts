import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const css = readFileSync('app/tokens.css', 'utf8');

function tokensOf(selector: string): Record<string, string> {
  const start = css.indexOf(`${selector} {`);
  const body = css.slice(start, css.indexOf('}', start));
  return Object.fromEntries([...body.matchAll(/--([a-z0-9-]+): (#[0-9a-f]{6})/g)].map(([, name = '', value = '']) => [name, value] as const));
}

const light = tokensOf(':root');
const dark = tokensOf(":root[data-theme='dark']");

function luminance(colour: string): number {
  const channels = [1, 3, 5].map((at) => parseInt(colour.slice(at, at + 2), 16) / 255);
  const [r = 0, g = 0, b = 0] = channels.map((c) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** WCAG 2.2, contrast ratio. */
function contrast(one: string | undefined, other: string | undefined): number {
  const [high = 0, low = 0] = [luminance(one ?? ''), luminance(other ?? '')].sort((a, b) => b - a);
  return (high + 0.05) / (low + 0.05);
}

describe.each([['light', light], ['dark', dark]])('the %s theme', (_, theme) => {
  it.each(['ink', 'graphite', 'pen', 'pass-text', 'fail-text', 'open-text'])('%s reads as text on paper and on wash', (name) => {
    expect(contrast(theme[name], theme.paper)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(theme[name], theme.wash)).toBeGreaterThanOrEqual(4.5);
  });

  it.each(['rule', 'pass', 'fail', 'open', 's1', 's2', 'si'])('%s can be seen as a mark or a line', (name) => {
    expect(contrast(theme[name], theme.paper)).toBeGreaterThanOrEqual(3);
  });

  it('graphite reads on both bands', () => {
    expect(contrast(theme.graphite, theme.band)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(theme.graphite, theme.band2)).toBeGreaterThanOrEqual(4.5);
  });
});

describe('the dark theme', () => {
  it('is the same by system setting and by choice on the page', () => {
    expect(tokensOf(":root:not([data-theme='light'])")).toEqual(dark);
  });

  it('has the tokens that the light theme has', () => {
    expect(Object.keys(dark)).toEqual(Object.keys(light));
  });
});

describe('contrast on paper', () => {
  it.each([['graphite', 7.12, 8.17], ['rule', 3.8, 4.05], ['pen', 7.84, 8.9], ['fail-text', 8.87, 7.12], ['open', 3.26, 10.09]])('of %s is %d and %d', (name, onLight, onDark) => {
    expect(contrast(light[name], light.paper)).toBeCloseTo(onLight, 1);
    expect(contrast(dark[name], dark.paper)).toBeCloseTo(onDark, 1);
  });
});
