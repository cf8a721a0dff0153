/** A file piece by piece. A stream is not iterable in every browser, so it is read by its reader. */
export async function* bytesOfFile(file: File): AsyncGenerator<Uint8Array> {
  const reader = file.stream().getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return;
    yield value;
  }
}
