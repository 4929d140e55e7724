import type { RefuseCell } from './cell-rows';
import type { Faces } from './measure-solid';
import { createStoredNumbers, type StoredSegment } from './stored-segment';

interface StoredFaces { faces: StoredSegment | null; faceOffsets: StoredSegment | null }

/** Reads the faces of a polyhedron, whose points have these numbers, as lists of places among them. */
export function createFaceReader({ faces, faceOffsets }: StoredFaces, refuse: RefuseCell): (cell: number, ids: Float64Array) => Faces {
  if (faces === null || faceOffsets === null) {
    return (cell) => refuse('malformed-vtk', `a polyhedron without its faces, cell ${cell + 1}`, 'the arrays faces and faceoffsets');
  }
  const [value, offset] = [createStoredNumbers(faces), createStoredNumbers(faceOffsets)];
  let last = 0;
  return (cell, ids) => {
    const [begin, end] = [last, offset(cell)];
    if (!(end > begin && end <= faces.length)) refuse('malformed-vtk', `faceoffset ${end} after ${begin}, cell ${cell + 1}`, `offsets that rise to ${faces.length}`);
    last = end;
    const places = new Map([...ids].map((id, place) => [id, place]));
    let at = begin;
    const take = (): number => {
      if (at >= end) refuse('malformed-vtk', `faces beyond faceoffset ${end}, cell ${cell + 1}`, 'the number of faces, and of each its points');
      at += 1;
      return value(at - 1);
    };
    const list: number[][] = [];
    for (let left = take(); left > 0; left -= 1) {
      const face: number[] = [];
      for (let corners = take(); corners > 0; corners -= 1) {
        const id = take();
        face.push(places.get(id) ?? refuse('malformed-vtk', `point ${id} in a face, cell ${cell + 1}`, 'points of the cell'));
      }
      if (face.length < 3) refuse('malformed-vtk', `a face of ${face.length} points, cell ${cell + 1}`, '3 or more');
      list.push(face);
    }
    if (at !== end) refuse('malformed-vtk', `${end - at} numbers after the faces, cell ${cell + 1}`, 'the end of its faces');
    return list;
  };
}
