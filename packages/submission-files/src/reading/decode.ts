import { ByteDecoder } from './byte-decoder.ts';
import type { Encoding } from './byte-decoder.ts';
import { countLineBreaks } from './count-line-breaks.ts';
import { unreadable } from './unreadable.ts';
import type { Unreadable } from './unreadable.ts';

export type Decoded = { readonly ok: true; readonly text: string; readonly encoding: Encoding } | Unreadable;

/** Decodes a whole file: UTF-8 with or without mark, UTF-16 of both orders, Windows-1252. Content that is no text is refused, with the place. */
export function decode(bytes: Uint8Array): Decoded {
  const decoder = new ByteDecoder();
  try {
    return { ok: true, text: decoder.decode(bytes, true, (text) => 1 + countLineBreaks(text)), encoding: decoder.encoding };
  } catch (error) {
    return unreadable(error);
  }
}
