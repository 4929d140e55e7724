/** The bytes as they come, and an error at their end where they are not as many as were stored: the file is not to blame. */
export async function* wholeFile(source: AsyncIterable<Uint8Array>, expected: number): AsyncGenerator<Uint8Array> {
  let bytes = 0;
  for await (const chunk of source) {
    bytes += chunk.length;
    yield chunk;
  }
  if (bytes !== expected) throw new Error(`Storage gave ${bytes} bytes of a file of ${expected}.`);
}
