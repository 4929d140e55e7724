import { oneOf, upTo, type Random } from '@/tests/support/random';
import { unstructuredPiece, writeVtk, type VtkArray, type VtkForm, type VtkPiece } from '@/tests/support/vtk-writer';

const form = (random: Random): VtkForm => ({
  encoding: oneOf(random, ['ascii', 'inline', 'base64', 'raw']), header: oneOf(random, ['UInt32', 'UInt64']), bigEndian: random() < 0.3, shuffled: random() < 0.3,
  ...(random() < 0.5 && { block: 8 + upTo(random, 200) }),
});
const list = (random: Random, count: number) => Array.from({ length: count }, () => random());
const fields = (random: Random, count: number): VtkArray[] => [
  { name: 'u', type: oneOf(random, ['Float64', 'Float32']), values: list(random, count) }, { name: 'U', components: 3, values: list(random, 3 * count) },
  ...(random() < 0.3 ? [{ name: 'vtkGhostType', type: 'UInt8' as const, values: list(random, count).map((value) => (value < 0.2 ? 1 : 0)) }] : []),
];

/** n × n squares or pairs of triangles. */
function unstructured(random: Random): VtkPiece {
  const n = 1 + upTo(random, 4);
  const points = Array.from({ length: (n + 1) ** 2 }, (_, i) => [i % (n + 1), Math.floor(i / (n + 1)), 0]);
  const cells = Array.from({ length: n * n }, (_, i) => {
    const at = (i % n) + Math.floor(i / n) * (n + 1);
    const corners = [at, at + 1, at + n + 2, at + n + 1] as const;
    return random() < 0.5 ? [[9, corners] as const] : [[5, corners.slice(0, 3)] as const, [5, [corners[0], corners[2], corners[3]]] as const];
  }).flat();
  return unstructuredPiece(points, cells, { cells: random() < 0.7 ? fields(random, cells.length) : [], points: random() < 0.5 ? fields(random, points.length) : [] });
}

function rectilinear(random: Random): { attributes: Record<string, string>; piece: VtkPiece } {
  const [nx, ny] = [1 + upTo(random, 4), 1 + upTo(random, 4)];
  const extent = `0 ${nx} 0 ${ny} 0 0`;
  const axis = (name: string, count: number) => ({ name, values: Array.from({ length: count }, (_, i) => i * 0.5) });
  return {
    attributes: { WholeExtent: extent },
    piece: { attributes: { Extent: extent }, sections: { CellData: fields(random, nx * ny), PointData: [], Coordinates: [axis('x', nx + 1), axis('y', ny + 1), axis('z', 1)] } },
  };
}

/** A grid of VTK XML in one of its encodings. */
export function anyVtk(random: Random): Buffer {
  if (random() < 0.3) {
    const { attributes, piece } = rectilinear(random);
    return writeVtk({ kind: 'RectilinearGrid', attributes, pieces: [piece] }, form(random));
  }
  const pieces = random() < 0.8 ? [unstructured(random)] : [unstructured(random), unstructured(random)];
  return writeVtk({ kind: 'UnstructuredGrid', pieces, ...(random() < 0.3 && { time: random() }) }, form(random));
}
