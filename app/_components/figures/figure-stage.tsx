'use client';

import type { CSSProperties, KeyboardEvent, ReactNode, Ref } from 'react';

interface FigureStageProps {
  ref: Ref<HTMLDivElement>;
  name: string;
  /** Which grid is read out, counted from the finest. */
  place: number;
  count: number;
  words: string;
  onMove: (place: number) => void;
  /** Heights to keep free, in CSS lengths that follow the container's width. */
  room: { narrow: string; wide: string };
  children: ReactNode;
}

/** Where a figure is drawn; arrow keys move its read-out from grid to grid, right to coarser ones as the axis grows. */
export function FigureStage({ ref, name, place, count, words, onMove, room, children }: FigureStageProps) {
  const move = (event: KeyboardEvent) => {
    const targets: Partial<Record<string, number>> = {
      ArrowRight: place + 1, ArrowUp: place + 1, ArrowLeft: place - 1, ArrowDown: place - 1, Home: 0, End: count - 1,
    };
    const target = targets[event.key];
    if (target === undefined) return;
    event.preventDefault();
    onMove(Math.min(count - 1, Math.max(0, target)));
  };
  return (
    <div ref={ref} className="figure-stage">
      <div
        role="slider"
        tabIndex={0}
        aria-label={name}
        aria-valuemin={1}
        aria-valuemax={count}
        aria-valuenow={place + 1}
        aria-valuetext={words}
        onKeyDown={move}
        className="figure-room flex"
        style={{ '--room-narrow': room.narrow, '--room-wide': room.wide } as CSSProperties}
      >
        {children}
      </div>
    </div>
  );
}
