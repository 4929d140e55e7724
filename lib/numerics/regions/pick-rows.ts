import type { ColumnEngine } from '../column-engine';
import type { NormBlock } from '../norms/norm-gatherer';
import type { RowClasses } from './classify-rows';

/** Rows copied at once, in the memory of an engine, which cannot grow later. */
export const mostPicked = 2048;

/** Copies weights and fields of the rows of one class together, of at most `mostPicked` rows; the copy is good until the next one is made. */
export function createRowPicker(fieldCount: number, engine: ColumnEngine | null): (block: NormBlock, classified: RowClasses, kind: number) => NormBlock {
  const room = () => engine?.allocate(mostPicked) ?? new Float64Array(mostPicked);
  const weightsRoom = room();
  const rooms = Array.from({ length: fieldCount }, () => ({ values: room(), exact: room() }));
  const placesRoom = room();
  const places = new Int32Array(placesRoom.buffer, placesRoom.byteOffset, mostPicked);
  const copyRows = (column: Float64Array, into: Float64Array, rows: number) => {
    if (engine?.pick(column, places, into, rows) === true) return;
    for (let at = 0; at < rows; at += 1) into[at] = column[places[at] as number] as number;
  };
  return (block, { classes, counts }, kind) => {
    const rows = counts[kind] ?? 0;
    let found = 0;
    for (let i = 0; found < rows; i += 1) if (classes[i] === kind) places[found++] = i;
    const { x, y, z, weights } = block;
    for (const [index, { values, exact }] of block.fields.entries()) {
      const own = rooms[index] as (typeof rooms)[number];
      copyRows(values, own.values, rows);
      copyRows(exact, own.exact, rows);
    }
    if (weights !== null) copyRows(weights, weightsRoom, rows);
    return { rows, x, y, z, weights: weights && weightsRoom, fields: rooms, places };
  };
}
