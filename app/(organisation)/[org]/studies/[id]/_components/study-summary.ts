import { countWord } from '@/lib/domain/numbers/count-word';
import type { Study } from '@/lib/domain/studies/schema';
import { gridSize } from './grid-size';

const refined = { space: 'in space', time: 'in time', 'space-time': 'in space and time' } as const;

function capitalise(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** What a study is, in a line: "Order case on brack 2.4.0. Five grids refined in space, 8 × 8 to 128 × 128 cells." */
export function summariseStudy(study: Study): string {
  const { grids, dimension } = study;
  const count = capitalise(countWord(grids.length));
  const [finest, coarsest] = [grids[0], grids.at(-1)].map((grid) => (grid ? gridSize(grid, dimension) : null));
  const range = !finest || !coarsest || grids.length < 2 ? '' : `, ${coarsest.replace(/\scells$/, '')} to ${finest.replace(/^(h|Δt)\s/, '')}`;
  return `${capitalise(study.case.kind)} case on ${study.code.name} ${study.release.version}. ${count} grid${grids.length === 1 ? '' : 's'} refined ${refined[study.refinement]}${range}.`;
}
