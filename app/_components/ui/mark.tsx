import { outcomeMarkShapes, type MarkName, type MarkShape } from '@/lib/figures/outcome-marks';

const words: Record<MarkName, string> = {
  pass: 'pass',
  fail: 'fail',
  inconclusive: 'inconclusive',
  'not-run': 'not run',
  exact: 'pass, exact',
  'meets-target': 'meets target',
  'misses-target': 'misses target',
  'inconclusive-solution': 'inconclusive',
};

const fills = { pass: 'fill-pass', fail: 'fill-fail', open: 'fill-open', ink: 'fill-ink', rule: 'fill-rule', graphite: 'fill-graphite' };
const strokes = { pass: 'stroke-pass', fail: 'stroke-fail', open: 'stroke-open', ink: 'stroke-ink', rule: 'stroke-rule', graphite: 'stroke-graphite' };
const places = {
  16: { line: '-ml-[2px]', text: '-ml-px', foot: 'align-[-2px]' },
  24: { line: '-ml-[3px]', text: '-ml-px', foot: 'align-[-3px]' },
  32: { line: '-ml-[4px]', text: '-ml-px', foot: 'align-[-4px]' },
};

export interface MarkProps {
  mark: MarkName;
  size?: 16 | 24 | 32;
  waived?: boolean;
  signed?: boolean;
  struck?: 'superseded' | 'withdrawn';
  /** At the start of a line the mark hangs out by the room in its box, so that its base lines up with the text. */
  lineStart?: boolean;
  /** Where the word stands beside the mark a screen reader should hear it once. */
  hidden?: boolean;
}

function Shape({ shape }: { shape: MarkShape }) {
  if (shape.stroke === undefined) return <path d={shape.path} fillRule="evenodd" className={fills[shape.colour]} />;
  return <path d={shape.path} fill="none" strokeWidth={shape.stroke} className={strokes[shape.colour]} />;
}

export function Mark({ mark, size = 16, waived, signed, struck, lineStart, hidden }: MarkProps) {
  const label = [words[mark], waived && 'waived', struck, signed && 'signed'].filter(Boolean).join(', ');
  const place = places[size];
  return (
    <svg
      viewBox="0 0 16 16"
      width={size}
      height={size}
      className={`inline-block shrink-0 ${place.foot} ${lineStart ? place.line : place.text}`}
      {...(hidden ? { 'aria-hidden': true } : { role: 'img', 'aria-label': label })}
    >
      {outcomeMarkShapes(mark, { waived, signed, struck: struck !== undefined }).map((shape) => (
        <Shape key={shape.path} shape={shape} />
      ))}
    </svg>
  );
}
