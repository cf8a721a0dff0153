/** Cohort statistics from a frozen release, disclosure-controlled. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { Id, Instant, Site } from './vocabulary.ts';

/** ND: the grade, or whether the person counts as A to E at all, cannot be determined. */
export const grades = ['A', 'B', 'C', 'D', 'E', 'ND'] as const;
export const Grade = z.enum(grades);

export const Release = z.strictObject({
  id: Id,
  number: z.number().int(),
  madeAt: Instant,
  /** Rounded to the nearest 5. */
  participants: z.number().int(),
  note: z.string(),
});

/** Hidden cells say nothing more: primary and complementary hiding look the same. */
export const Cell = z.discriminatedUnion('state', [
  z.strictObject({ state: z.literal('hidden') }),
  z.strictObject({ state: z.literal('empty') }),
  z.strictObject({
    state: z.literal('shown'),
    n: z.number().int(),
    /** Mean of the chosen statistic in the outcome's unit. */
    mean: z.number(),
    /** Sample SD and two-sided 95% t interval; null where n = 1 or all values are equal. */
    sd: z.number().nullable(),
    interval: z.strictObject({ lower: z.number(), upper: z.number() }).nullable(),
  }),
]);
export type Cell = z.output<typeof Cell>;

export const Outcome = z.strictObject({
  key: z.string(),
  name: z.string(),
  unit: z.string(),
  better: z.enum(['higher', 'lower', 'neutral']),
  decimals: z.number().int(),
  inDevice: z.boolean(),
});

/** `change` is end of course minus baseline in people with both. */
export const GridStatistic = z.enum(['change', 'baseline', 'end']);

export const Grid = z.strictObject({
  /** The release the figures come from; null for a site's own, live figures. */
  release: Release.nullable(),
  /** Set when these are the exact, live figures of one's own site. */
  site: Site.nullable(),
  statistic: GridStatistic,
  outcome: Outcome,
  grades: z.array(Grade),
  rows: z.array(z.strictObject({ levelGroup: z.string(), label: z.string(), cells: z.array(Cell), total: Cell })),
  columnTotals: z.array(Cell),
  total: Cell,
  /** Courses left out of the grid and why; null where the count itself is hidden. */
  leftOut: z.strictObject({
    noBaseline: z.number().int().nullable(),
    noEndOfCourse: z.number().int().nullable(),
    unable: z.number().int().nullable(),
    levelOrGradeNotDeterminable: z.number().int().nullable(),
  }),
  /** Participants per neurological level, nearest 5; null where hidden. */
  levels: z.array(z.strictObject({ level: z.string(), levelGroup: z.string(), participants: z.number().int().nullable() })),
  method: z.string(),
  notes: z.array(z.string()),
});
export type Grid = z.output<typeof Grid>;

export const getGrid = endpoint({
  method: 'GET',
  path: '/api/explore/grid',
  summary: 'Mean change by level group and AIS grade for one outcome',
  query: z.strictObject({
    outcome: z.string().max(40),
    inDevice: z.enum(['yes', 'no']).default('no'),
    statistic: GridStatistic.default('change'),
    release: z.coerce.number().int().min(1).optional(),
    /** Own site's exact live figures instead of the registry's. */
    siteId: Id.optional(),
  }),
  response: Grid,
  problems: ['not-found'],
});

export const listOutcomes = endpoint({
  method: 'GET',
  path: '/api/explore/outcomes',
  summary: 'Outcomes that can be explored',
  response: z.strictObject({ outcomes: z.array(Outcome), releases: z.array(Release) }),
  problems: [],
});

export const makeRelease = endpoint({
  method: 'POST',
  path: '/api/releases',
  summary: 'Freeze the registry as it is into a numbered release',
  body: z.strictObject({ note: z.string().trim().min(3, 'Say in a few words what this release is for').max(200) }),
  response: Release,
  status: 201,
  problems: ['release-unchanged'],
});

export const listReleases = endpoint({
  method: 'GET',
  path: '/api/releases',
  summary: 'The numbered releases, newest first',
  response: z.strictObject({ releases: z.array(Release) }),
  problems: [],
});

/** What anyone may see. Counts are rounded to the nearest 5 and small ones hidden (null). */
export const PublicFigures = z.strictObject({
  release: z.strictObject({ number: z.number().int(), madeAt: Instant }).nullable(),
  sites: z.number().int(),
  participants: z.number().int().nullable(),
  sessions: z.number().int().nullable(),
  bouts: z.number().int().nullable(),
  levelGroups: z.array(z.strictObject({ label: z.string(), participants: z.number().int().nullable() })),
  completeness: z.array(z.strictObject({ label: z.string(), participants: z.number().int().nullable() })),
});

export const getPublicFigures = endpoint({
  method: 'GET',
  path: '/api/public/figures',
  summary: 'The registry at a glance, for anyone',
  response: PublicFigures,
  problems: [],
});
