/**
 * What the page that prepares a month and the page around it say to each other. The preparing page sees record numbers, dates and the
 * site key, and may connect to nothing; the page around it talks to the registry and sees only what is parsed here.
 *
 * The preparing page is built into one file that runs in a sandbox (origin `null`) here and from a clinic's disk elsewhere. So it has
 * no storage, imports its worker as `./….ts?worker`, and posts to `parent` with `'*'` as the origin: nobody else may frame it.
 */
import { tableKeys } from '@cairnstep/dictionary';
import { z } from 'zod';

/** A code (such as 1* in an exam), a number, a study day: nothing that needs quotation marks, and no blank for a sentence. */
const CleanText = z.string().regex(/^[A-Za-z0-9_.,+*\-\r\n]*$/);

const ParticipantCode = z.string().regex(/^S[0-9A-HJKMNP-TV-Z]{21}$/);

export const ReplacedCodes = z.array(z.strictObject({ from: ParticipantCode, to: ParticipantCode })).max(100_000);
export type ReplacedCodes = z.output<typeof ReplacedCodes>;

export const PreparedTable = z.strictObject({
  table: z.enum(tableKeys),
  rows: z.number().int().nonnegative(),
  /** The bytes to be sent, UTF-8: a header line of the dictionary's columns, then one line a row, CRLF. */
  csv: z.instanceof(ArrayBuffer),
});
export type PreparedTable = z.output<typeof PreparedTable>;

/** From the page around it, once the preparing page is ready, and again when what it says has changed. */
export interface Task {
  readonly kind: 'task';
  readonly view: 'prepare' | 'key';
  readonly site: { readonly code: string; readonly name: string };
  /** `2026-11`; the month to prepare. */
  readonly month: string | null;
  /** Participant codes that the registry holds of this site: a key file that lacks some of them is an older copy. */
  readonly knownParticipants: readonly string[];
  /** Headers that a steward has marked as safe for this site. */
  readonly safeHeaders: readonly string[];
  readonly theme: 'light' | 'dark' | 'system';
}

/** How far the sending of what was prepared has come. */
export interface Sending {
  readonly kind: 'sending';
  readonly state: 'under-way' | 'done' | 'failed';
  /** Tables; the one under way counts by the part of it that has left. */
  readonly done: number;
  readonly of: number;
  /** What went wrong and what to do, when it failed. */
  readonly message: string | null;
}

export type ToPreparing = Task | Sending;

/** From the preparing page. */
export const FromPreparing = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('ready') }),
  /** Its height in CSS pixels, so that it needs no scroll bar of its own. */
  z.strictObject({ kind: z.literal('height'), pixels: z.number().int().min(0).max(200_000) }),
  /** Something would be lost if the page were closed now. */
  z.strictObject({ kind: z.literal('unsaved'), isUnsaved: z.boolean() }),
  /** The coordinator has seen the preview, saved the key file and asks to send. */
  z.strictObject({ kind: z.literal('send'), tables: z.array(PreparedTable).min(1).max(tableKeys.length), replacedCodes: ReplacedCodes }),
  /** Codes that a rotation or a merging of key files has replaced, without a month. */
  z.strictObject({ kind: z.literal('replace-codes'), replacedCodes: ReplacedCodes }),
  /** The coordinator is through and wants to see the submission. */
  z.strictObject({ kind: z.literal('finished') }),
]);
export type FromPreparing = z.output<typeof FromPreparing>;

/** Whether bytes that claim to be clean can only hold codes and numbers. Checked before anything is sent. */
export const isCleanCsv = (csv: ArrayBuffer): boolean => CleanText.safeParse(new TextDecoder('utf-8', { fatal: true }).decode(csv)).success;
