/**
 * The grid of a release of 30,000 people over HTTP, protected and with intervals: beside one plain SQL aggregate over the same rows, sent to the
 * same server by a client of its own.
 */
import { makePerson } from '../../../tests/support/people.ts';
import { withProduct, type RunningProduct } from '../running-product.ts';
import type { Scenario } from '../scenario.ts';

const people = 30_000;
const rounds = 15;

/** One release, made of numbers alone: twelve sites, six level groups, four grades. */
async function fill({ people: { database } }: RunningProduct): Promise<void> {
  const { owner } = database;
  await owner.query(
    `insert into releases (id, number, note, totals, digest) values (gen_random_uuid(), 1, 'bench', '{"participants": ${people}, "sites": 12, "sessions": 0, "bouts": 0}', 'bench')`,
  );
  await owner.query(
    `insert into release_courses (release_number, site_id, participant, course_no, nli, level_group, ais, sessions, bouts, walking_min, distance_m, steps)
     select 1, ('00000000-0000-4000-8000-' || lpad((i % 12)::text, 12, '0'))::uuid, 'P' || i, 1, 'T4', (array['c1_c4', 'c5_c8', 't1_t9', 't10_t12', 'l1_l5', 's1_s3'])[i % 6 + 1],
            (array['A', 'B', 'C', 'D'])[i / 6 % 4 + 1], 0, 0, 0, 0, 0 from generate_series(1, $1::int) i`,
    [people],
  );
  await owner.query(
    `insert into release_outcomes (release_number, site_id, participant, course_no, measure, in_device, baseline_status, baseline_value, end_status, end_value)
     select 1, site_id, participant, 1, 'tmwt_ss', 'no', 'done', (hashtext(participant) % 100 + 100) / 200.0, 'done', (hashtext(participant || 'e') % 100 + 110) / 200.0 from release_courses`,
  );
  await owner.query('analyze release_courses, release_outcomes');
}

const aggregate = `select c.level_group, c.ais, count(*), avg(o.end_value - o.baseline_value), stddev_samp(o.end_value - o.baseline_value)
  from release_courses c join release_outcomes o using (release_number, site_id, participant, course_no)
 where c.release_number = 1 and o.measure = 'tmwt_ss' and o.in_device = 'no' and o.baseline_value is not null and o.end_value is not null
 group by grouping sets ((c.level_group, c.ais), (c.level_group), (c.ais), ())`;

async function milliseconds(work: () => Promise<unknown>): Promise<number> {
  const begun = performance.now();
  await work();
  return performance.now() - begun;
}
const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0;

interface Times {
  readonly cold: number;
  readonly warm: number;
  readonly peer: number;
}

let measured: Promise<Times> | undefined;
const measure = (): Promise<Times> =>
  (measured ??= withProduct(async (product) => {
    await fill(product);
    const { cookie } = await makePerson(product.people, { grants: [{ role: 'researcher' }] });
    const grid = async (): Promise<void> => {
      const answer = await fetch(`${product.api.url}/api/explore/grid?outcome=tmwt_ss`, { headers: { Cookie: cookie } });
      if (!answer.ok) throw new Error(`The grid answered ${answer.status}.`);
      await answer.arrayBuffer();
    };
    const cold = await milliseconds(grid);
    const warm: number[] = [];
    const peer: number[] = [];
    for (let round = 0; round < rounds; round += 1) {
      warm.push(await milliseconds(grid));
      peer.push(await milliseconds(() => product.people.database.owner.query(aggregate)));
    }
    return { cold, warm: median(warm), peer: median(peer) };
  }));

const peerName = 'one plain SQL aggregate of the same rows, PostgreSQL 15';

export const scenarios: readonly Scenario[] = [
  {
    name: `grid of ${people.toLocaleString('en')} people, first time`,
    run: async () => ({ ours: (await measure()).cold, peer: (await measure()).peer, unit: 'ms', peerName }),
  },
  {
    name: `grid of ${people.toLocaleString('en')} people, again`,
    run: async () => ({ ours: (await measure()).warm, peer: (await measure()).peer, unit: 'ms', peerName }),
  },
];
