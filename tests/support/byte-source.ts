/** Bytes as they arrive from storage, cut at the given places. */
export async function* byteSource(content: string | Uint8Array, cuts: readonly number[] = []): AsyncGenerator<Uint8Array> {
  const bytes = typeof content === 'string' ? Buffer.from(content, 'utf8') : content;
  const places = [0, ...[...cuts].sort((a, b) => a - b), bytes.length];
  for (const [index, from] of places.entries()) {
    const to = places[index + 1];
    if (to !== undefined && to > from) yield bytes.subarray(from, to);
    await Promise.resolve();
  }
}
