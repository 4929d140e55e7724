import { describe, expect, it } from 'vitest';
import { outcomeMarkShapes } from '@/lib/figures/outcome-marks';

const colours = (shapes: ReturnType<typeof outcomeMarkShapes>) => shapes.map(({ colour }) => colour);

describe('outcomeMarkShapes(mark, state)', () => {
  it('never draws a met target in the green of a pass', () => {
    expect(colours(outcomeMarkShapes('meets-target', {}))).toEqual(['ink']);
  });

  it('cuts the corner of a fail for the stroke of a waiver, and leaves the fail its colour', () => {
    const [fail, stroke] = outcomeMarkShapes('fail', { waived: true });
    expect(fail).toMatchObject({ colour: 'fail', path: 'M7.5 1H15V7H2V6.5zM2 8H15V14H2z' });
    expect(stroke).toMatchObject({ colour: 'ink', stroke: 1.6 });
  });

  it('underlines a signed mark', () => {
    expect(outcomeMarkShapes('pass', { signed: true }).at(-1)?.path).toBe('M2 15h13v1H2z');
  });

  it('takes the colour from what was superseded', () => {
    expect(colours(outcomeMarkShapes('fail', { struck: true }))).toEqual(['graphite', 'graphite']);
  });
});
