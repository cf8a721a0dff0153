/** Small schemas shared by several features. */
import { z } from 'zod';

export const Id = z.uuid();
/** Calendar month, `2026-11`. */
export const Month = z.string().regex(/^20\d\d-(0[1-9]|1[0-2])$/, 'Write a month as year and month, for example 2026-11');
export const Instant = z.iso.datetime();
export const CalendarDate = z.iso.date();
export const Digest = z.string().regex(/^[0-9a-f]{64}$/);
export const SiteCode = z.string().regex(/^S\d\d$/);

export const roles = ['therapist', 'coordinator', 'researcher', 'steward', 'administrator'] as const;
export const Role = z.enum(roles);
export type Role = z.output<typeof Role>;

export const Page = z.coerce.number().int().min(1).max(100_000).default(1);
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.strictObject({ items: z.array(item), page: z.number().int(), pageSize: z.number().int(), total: z.number().int() });

export const Site = z.strictObject({ id: Id, code: SiteCode, name: z.string() });
export type Site = z.output<typeof Site>;
