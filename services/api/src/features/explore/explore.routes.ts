/** Cohort statistics from frozen releases, and a site's own live figures. */
import type { Grid, InputOf, Outcome, PublicFigures, Release, ResponseOf } from '@cairnstep/contract';
import { grades } from '@cairnstep/contract';
import type { getGrid as GetGrid, listOutcomes as ListOutcomes } from '@cairnstep/contract';
import { measureOf, spinalLevels } from '@cairnstep/dictionary';
import { SMALLEST_SHOWN } from '@cairnstep/disclosure';
import { levelGroups } from '@cairnstep/scoring';
import type { z } from 'zod';
import { statistics, type Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { route, type Route } from '../../http/route.ts';
import { readSite } from '../people/sites.repository.ts';
import type { CourseFact, OutcomeFact } from './facts.ts';
import {
  listMeasured,
  listReleases,
  readRelease,
  readReleaseCourses,
  readReleaseOutcome,
  readSiteCourses,
  readSiteOutcome,
  type ReleaseRecord,
} from './explore.repository.ts';
import { gridCells, leftOutCounts, type Statistic, type View } from './grid.ts';
import { makeRelease } from './make-release.ts';
import { publicCount, publicCounts } from './public-count.ts';
import { ReleaseCache } from './release-cache.ts';

type OutcomeOut = z.output<typeof Outcome>;
type ReleaseOut = z.output<typeof Release>;
type Figures = z.output<typeof PublicFigures>;

const presentRelease = (release: ReleaseRecord): ReleaseOut => ({
  id: release.id,
  number: release.number,
  madeAt: release.madeAt.toISOString(),
  participants: publicCount(release.totals.participants) ?? 0,
  note: release.note,
});

function presentOutcome(key: string, inDevice: boolean): OutcomeOut | null {
  const measure = measureOf(key);
  if (!measure || !measure.entered) return null;
  return { key, name: measure.name, unit: measure.unit, better: measure.better, decimals: measure.decimals, inDevice };
}

const statisticWords: Readonly<Record<Statistic, string>> = {
  change: 'Mean change, end of course minus baseline',
  baseline: 'Mean at baseline',
  end: 'Mean at end of course',
};

const methodOf = (statistic: Statistic, view: View): string =>
  `${statisticWords[statistic]}, with sample SD and two-sided 95% interval from Student's t distribution; first course of each person` +
  (view === 'registry' || statistic === 'change' ? '; people with both values.' : '; everyone with the value.');

function notesOf(view: View, outcome: OutcomeOut): string[] {
  const notes = [
    outcome.inDevice
      ? 'Measured in the training device. Never compare with results measured without it.'
      : 'Measured without the training device.',
    'People who tried and were unable have no value; they are counted beside the grid, not as zero.',
    'Level group and grade come from the last exam on or before the first session, at most 90 days earlier.',
  ];
  if (view === 'registry')
    notes.push(
      'Groups of 1 to 10 people are hidden, and with them what would give them back; so are groups that come mostly from one clinic.',
    );
  return notes;
}

/** Level groups top down, then people without a deficit's level and people whose level cannot be determined. */
const gridRows: readonly { readonly id: string; readonly label: string }[] = [
  ...levelGroups.groups,
  { id: 'ND', label: 'Not determinable' },
];

/** Completeness as printed for the public: classes of grades that leave no one out. */
const completeness: readonly { readonly label: string; readonly holds: (course: CourseFact) => boolean }[] = [
  { label: 'Complete (AIS A)', holds: ({ ais }) => ais === 'A' },
  { label: 'Sensory incomplete (AIS B)', holds: ({ ais }) => ais === 'B' },
  { label: 'Motor incomplete (AIS C and D)', holds: ({ ais }) => ais === 'C' || ais === 'D' },
  { label: 'Normal examination after an earlier deficit (AIS E)', holds: ({ ais }) => ais === 'E' },
  { label: 'Not determinable', holds: ({ ais }) => ais === 'ND' },
];

function levelColumn(courses: readonly CourseFact[], view: View): Grid['levels'] {
  const exact = spinalLevels.map((level) => courses.filter((course) => course.nli === level).length);
  // Whoever has no single level is part of the total, so of the protection too.
  const shown = view === 'site' ? exact : publicCounts([...exact, courses.length - exact.reduce((sum, count) => sum + count, 0)]);
  return spinalLevels.map((level, index) => ({
    level,
    levelGroup: levelGroups.groupOf(level) ?? 'ND',
    participants: shown[index] ?? null,
  }));
}

export function exploreRoutes({ database, ...context }: Context): Route[] {
  const outcomes = new ReleaseCache<readonly OutcomeFact[]>();
  const courses = new ReleaseCache<readonly CourseFact[]>();
  const asStatistics = <T>(work: Parameters<typeof asActor<T>>[2]): Promise<T> => asActor(database, statistics, work);

  function present(
    facts: readonly OutcomeFact[],
    people: readonly CourseFact[],
    outcome: OutcomeOut,
    statistic: Statistic,
    view: View,
  ): Omit<Grid, 'release' | 'site'> {
    const options = { rows: gridRows.map((row) => row.id), statistic, view, decimals: outcome.decimals };
    const { cells, rowTotals, columnTotals, total } = gridCells(facts, options);
    return {
      statistic,
      outcome,
      grades: [...grades],
      rows: gridRows.map((row, index) => ({
        levelGroup: row.id,
        label: row.label,
        cells: [...(cells[index] ?? [])],
        total: rowTotals[index] ?? { state: 'empty' },
      })),
      columnTotals: [...columnTotals],
      total,
      leftOut: leftOutCounts(facts, options),
      levels: levelColumn(people, view),
      method: methodOf(statistic, view),
      notes: notesOf(view, outcome),
    };
  }

  async function getGrid(actor: Actor, input: InputOf<typeof GetGrid>): Promise<Grid> {
    const outcome = presentOutcome(input.outcome, input.inDevice === 'yes');
    if (!outcome) throw new Refusal('not-found', 'The registry has no such outcome.');
    const { siteId } = input;
    if (siteId !== undefined) {
      requireMayAtSite(actor, 'see-site-figures', siteId);
      return asActor(database, actor, async (tx) => {
        const { id, code, name } = requireFound(await readSite(tx, siteId));
        const facts = await readSiteOutcome(tx, siteId, outcome.key, input.inDevice);
        return {
          release: null,
          site: { id, code, name },
          ...present(facts, await readSiteCourses(tx, siteId), outcome, input.statistic, 'site'),
        };
      });
    }
    const release = requireFound(await asStatistics((tx) => readRelease(tx, input.release)));
    const facts = await outcomes.get(release.number, `${outcome.key} ${input.inDevice}`, () =>
      asStatistics((tx) => readReleaseOutcome(tx, release.number, outcome.key, input.inDevice)),
    );
    const people = await courses.get(release.number, 'all', () => asStatistics((tx) => readReleaseCourses(tx, release.number)));
    return { release: presentRelease(release), site: null, ...present(facts, people, outcome, input.statistic, 'registry') };
  }

  async function listOutcomes(): Promise<ResponseOf<typeof ListOutcomes>> {
    return asStatistics(async (tx) => {
      const releases = await listReleases(tx);
      const measured = releases[0] ? await listMeasured(tx, releases[0].number, SMALLEST_SHOWN) : [];
      return {
        outcomes: measured.flatMap(({ measure, inDevice }) => presentOutcome(measure, inDevice === 'yes') ?? []),
        releases: releases.map(presentRelease),
      };
    });
  }

  async function publicFigures(): Promise<Figures> {
    const release = await asStatistics((tx) => readRelease(tx, undefined));
    if (!release) return { release: null, sites: 0, participants: null, sessions: null, bouts: null, levelGroups: [], completeness: [] };
    const people = await courses.get(release.number, 'all', () => asStatistics((tx) => readReleaseCourses(tx, release.number)));
    const counted = (classes: readonly { label: string; holds: (course: CourseFact) => boolean }[]) => {
      const shown = publicCounts(classes.map(({ holds }) => people.filter(holds).length));
      return classes.map(({ label }, index) => ({ label, participants: shown[index] ?? null }));
    };
    return {
      release: { number: release.number, madeAt: release.madeAt.toISOString() },
      sites: release.totals.sites,
      participants: publicCount(release.totals.participants),
      sessions: publicCount(release.totals.sessions),
      bouts: publicCount(release.totals.bouts),
      levelGroups: counted(gridRows.map((row) => ({ label: row.label, holds: (course) => course.levelGroup === row.id }))),
      completeness: counted(completeness),
    };
  }

  return [
    route('getGrid', getGrid),
    route('listOutcomes', listOutcomes),
    route('listReleases', () => asStatistics(async (tx) => ({ releases: (await listReleases(tx)).map(presentRelease) }))),
    route('makeRelease', async (actor, input, { requestId }) =>
      presentRelease(await makeRelease({ database, ...context }, actor, input, requestId)),
    ),
    route('getPublicFigures', publicFigures),
  ];
}
