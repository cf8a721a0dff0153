import { codeFromBits } from './participant-code.ts';

/** A code that follows from nothing: 100 random bits. Two of 100,000 are the same once in about 10²⁰ registries. */
export async function randomPseudonym(): Promise<string> {
  return codeFromBits(crypto.getRandomValues(new Uint8Array(13)));
}
