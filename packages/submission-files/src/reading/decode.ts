import { ByteDecoder } from './byte-decoder.ts';
import type { Encoding } from './byte-decoder.ts';
import { countLineBreaks } from './count-line-breaks.ts';
import { UnreadableFile } from './unreadable-file.ts';

export type Decoded =
  | { readonly ok: true; readonly text: string; readonly encoding: Encoding }
  | { readonly ok: false; readonly rule: string; readonly found: string; readonly mend: string; readonly line: number | null };

/** Decodes a whole file: UTF-8 with or without mark, UTF-16 of both orders, Windows-1252. Content that is no text is refused, with the place. */
export function decode(bytes: Uint8Array): Decoded {
  const decoder = new ByteDecoder();
  try {
    return { ok: true, text: decoder.decode(bytes, true, (text) => 1 + countLineBreaks(text)), encoding: decoder.encoding };
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    return { ok: false, rule: error.rule, found: error.found, mend: error.mend, line: error.line };
  }
}
