/** The outlines of the outcome marks, in a box of 16 by 16 with the right edge at 15 and the base at 14. */

export type MarkName =
  | 'pass' | 'fail' | 'inconclusive' | 'not-run' | 'exact'
  | 'meets-target' | 'misses-target' | 'inconclusive-solution';

type MarkColour = 'pass' | 'fail' | 'open' | 'ink' | 'rule' | 'graphite';

export interface MarkShape {
  path: string;
  colour: MarkColour;
  /** Width of the line where the shape is drawn as an outline, absent where it is filled. */
  stroke?: number;
}

const circle = 'M15 7.5a6.5 6.5 0 1 1-13 0a6.5 6.5 0 0 1 13 0z';
const square = 'M2.5 1.5H14.5V13.5H2.5z';
const dots = (places: readonly string[]) => places.map((at) => `M${at}h2v2h-2z`).join('');
const triangleDots = dots(['1 12', '5 12', '9 12', '13 12', '13 8', '13 4', '13 0', '5 8', '9 4']);
const roundDots = dots(['13 6.5', '11.39 10.39', '7.5 12', '3.61 10.39', '2 6.5', '3.61 2.61', '7.5 1', '11.39 2.61']);

const plain: Record<MarkName, MarkShape> = {
  pass: { path: 'M2 14H15V1z', colour: 'pass' },
  fail: { path: 'M2 1H15V7H2zM2 8H15V14H2z', colour: 'fail' },
  inconclusive: { path: triangleDots, colour: 'open' },
  'not-run': { path: square, colour: 'rule', stroke: 1 },
  exact: { path: 'M2 14H15V1zM11 7.8a2.2 2.2 0 1 0 .01 0z', colour: 'pass' },
  'meets-target': { path: circle, colour: 'ink' },
  'misses-target': { path: 'M2.02 7a6.5 6.5 0 0 1 12.96 0zM2.02 8a6.5 6.5 0 0 0 12.96 0z', colour: 'fail' },
  'inconclusive-solution': { path: roundDots, colour: 'open' },
};

const struckOutlines: Record<MarkName, MarkShape> = {
  pass: { path: 'M3.7 13.5H14.5V2.7z', colour: 'graphite', stroke: 1 },
  exact: { path: 'M3.7 13.5H14.5V2.7z', colour: 'graphite', stroke: 1 },
  fail: { path: square, colour: 'graphite', stroke: 1 },
  'not-run': { path: square, colour: 'graphite', stroke: 1 },
  inconclusive: { path: triangleDots, colour: 'graphite' },
  'meets-target': { path: circle, colour: 'graphite', stroke: 1 },
  'misses-target': { path: circle, colour: 'graphite', stroke: 1 },
  'inconclusive-solution': { path: roundDots, colour: 'graphite' },
};

interface MarkState { waived?: boolean; signed?: boolean; struck?: boolean }

/** The shapes of a mark, back to front. A superseded or withdrawn outcome is `struck`: an outline crossed by a line. */
export function outcomeMarkShapes(mark: MarkName, { waived, signed, struck }: MarkState): MarkShape[] {
  const shapes: MarkShape[] = [];
  if (struck) shapes.push(struckOutlines[mark], { path: 'M2 1L15 14', colour: 'graphite', stroke: 1.2 });
  else if (waived && mark === 'fail') shapes.push({ path: 'M7.5 1H15V7H2V6.5zM2 8H15V14H2z', colour: 'fail' });
  else shapes.push(plain[mark]);
  if (waived) shapes.push({ path: 'M1.2 5.2L6.2 .2', colour: 'ink', stroke: 1.6 });
  if (signed) shapes.push({ path: 'M2 15h13v1H2z', colour: 'ink' });
  return shapes;
}
