import { describe, expect, it } from 'vitest';
import { matchFiles as match, type MatchableGrid, type NamedFile } from '@/lib/domain/uploads/match-files';

const matchFiles = (given: NamedFile[], grids: MatchableGrid[]) => match(given, grids, 2);
const plan = [8, 16, 32, 64, 128].map((n) => ({ label: `n${n}`, cells: n * n, cellsPerDirection: n }));
const files = (names: string[], sizes = names.map((_, index) => 1000 * 4 ** index)) => names.map((name, index) => ({ name, size: sizes[index] ?? 0 }));

describe('matchFiles', () => {
  it('takes the label where it is a word of the name', () => {
    expect(matchFiles(files(['run-N64.csv', 'n8_final.csv.gz']), plan)).toEqual(['n64', 'n8']);
    expect(matchFiles(files(['n640.csv']), plan)).toEqual([null]);
  });

  it('takes the cells per direction, leading zeros or not', () => {
    expect(matchFiles(files(['burgers_032.csv', 'burgers_128.csv', 'burgers_8.csv']), plan)).toEqual(['n32', 'n128', 'n8']);
  });

  it('takes the cells in all, and counts along each direction', () => {
    expect(matchFiles(files(['cells4096.dat']), plan)).toEqual(['n64']);
    const oblong = [{ label: 'a', cellsPerDirection: [8, 4] }, { label: 'b', cellsPerDirection: [16, 8] }];
    expect(matchFiles(files(['out_16x8.csv', 'out_8x4.csv']), oblong)).toEqual(['b', 'a']);
  });

  it('takes the number of the label, where it is the only one that fits', () => {
    const labelled = [{ label: 'mesh3' }, { label: 'mesh4' }, { label: 'mesh5' }];
    expect(matchFiles(files(['out_04.csv', 'out_03.csv']), labelled)).toEqual(['mesh4', 'mesh3']);
    expect(matchFiles(files(['D1_3.csv']), [{ label: 'g1' }, { label: 'g2' }, { label: 'g3' }])).toEqual([null]);
  });

  it('takes 64 for the cells along each direction where that reading fits more files, and asks where it stands alone', () => {
    const counted = plan.map(({ label, cells }) => ({ label: `g-${label.length}-${cells}`, cells }));
    expect(matchFiles(files(['burgers_008.csv', 'burgers_016.csv', 'burgers_032.csv', 'burgers_064.csv', 'burgers_128.csv']), counted))
      .toEqual(counted.map(({ label }) => label));
    expect(matchFiles(files(['burgers_064.csv']), counted)).toEqual([null]);
  });

  it('reads names that count the grids off, in the direction in which the files grow', () => {
    expect(matchFiles(files(['grid_1.csv', 'grid_2.csv', 'grid_3.csv', 'grid_4.csv', 'grid_5.csv.gz'], [4224, 18084, 74458, 301788, 261129]), plan))
      .toEqual(['n8', 'n16', 'n32', 'n64', 'n128']);
    expect(matchFiles(files(['D1_g1.csv', 'D1_g2.csv', 'D1_g3.csv', 'D1_g4.csv', 'D1_g5.csv'], [900, 700, 500, 300, 100]), plan))
      .toEqual(['n128', 'n64', 'n32', 'n16', 'n8']);
  });

  it('goes by size where names tell nothing and every file is packed alike', () => {
    expect(matchFiles(files(['medium.csv', 'fine.csv', 'coarse.csv'], [200, 900, 50]), plan.slice(0, 3))).toEqual(['n16', 'n32', 'n8']);
    expect(matchFiles(files(['medium.csv', 'fine.csv.gz', 'coarse.csv'], [200, 100, 50]), plan.slice(0, 3))).toEqual([null, null, null]);
    expect(matchFiles(files(['a.csv', 'b.csv', 'c.csv'], [50, 50, 90]), plan.slice(0, 3))).toEqual([null, null, null]);
  });

  it('leaves the choice to a person where there are fewer files than grids, or two claim one grid', () => {
    expect(matchFiles(files(['coarse.csv', 'fine.csv']), plan)).toEqual([null, null]);
    expect(matchFiles(files(['run1_64.csv', 'run2_64.csv']), plan)).toEqual([null, null]);
  });

  it('gives the files that remain the grids that remain', () => {
    expect(matchFiles(files(['n8.csv', 'last.csv']), plan.slice(0, 2))).toEqual(['n8', 'n16']);
  });
});
