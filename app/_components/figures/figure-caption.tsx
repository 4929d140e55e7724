import type { ReactNode } from 'react';
import { TextButton } from '../ui/text-link';

interface FigureCaptionProps {
  number: number;
  children: ReactNode;
  pointKey?: ReactNode;
  numbersId: string;
  areNumbersShown: boolean;
  onToggleNumbers: () => void;
}

export function FigureCaption({ number, children, pointKey, numbersId, areNumbersShown, onToggleNumbers }: FigureCaptionProps) {
  return (
    <figcaption className="mt-3 font-serif text-caption">
      <b>Figure {number}.</b> {children} {pointKey}{' '}
      <TextButton aria-expanded={areNumbersShown} aria-controls={numbersId} onClick={onToggleNumbers} className="screen-only ml-1 font-sans max-tablet:-my-3 max-tablet:py-3">
        Numbers
      </TextButton>
    </figcaption>
  );
}
