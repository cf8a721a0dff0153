/** A file, whole or as it arrives. */
export type ByteSource = Uint8Array | AsyncIterable<Uint8Array>;
