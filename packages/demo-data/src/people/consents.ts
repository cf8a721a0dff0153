/**
 * What the participants consented to, as terms of the Data Use Ontology. From wide to narrow, by the forms of the site and
 * the choices of the person; some end, some are replaced, and a few are withdrawn.
 */
import type { Random } from '../random.ts';
import { datedRow } from '../rows.ts';
import type { Cells, DatedRow } from '../rows.ts';
import type { Permission } from '../sites.ts';
import { isCervical } from './person.ts';
import type { Person } from './person.ts';

/** Share of consents, in per cent, that carry a modifier. */
const modifiers = {
  nmds: 8,
  gso: 0.4,
  npuncu: 5,
  pub: 14,
  col: 7,
  irb: 55,
  us: 1,
  ps: 1.5,
  is: 1,
  rtn: 9,
  cc: 6,
  npoa: 18,
  npu: 8,
  ncu: 13,
} as const;

const flag = (random: Random, percent: number): 'yes' | 'no' => (random.chance(percent / 100) ? 'yes' : 'no');

function condition(random: Random, person: Person): string {
  const region = isCervical(person) ? 'cervical_sci' : person.nli.startsWith('T') ? 'thoracic_sci' : 'lumbosacral_sci';
  const own =
    person.cause === 'non_traumatic' ? { non_traumatic_sci: 15 } : person.cause === 'unknown' ? {} : { traumatic_sci: 15, [region]: 9 };
  return random.weighted<string>({ spinal_cord_injury: 48, spinal_cord_disorder: 15, nervous_system: 11, ...own, not_stated: 2 });
}

function termCells(random: Random, person: Person, permission: Permission): Cells {
  const flags = Object.fromEntries(Object.entries(modifiers).map(([term, percent]) => [`duo_${term}`, flag(random, percent)]));
  const rs = flag(random, 5);
  const gs = flag(random, 12);
  const mor = flag(random, 3);
  const ts = flag(random, 6);
  return {
    permission,
    condition: permission === 'DS' ? condition(random, person) : null,
    ...flags,
    duo_rs: rs,
    duo_rs_kind: rs === 'yes' ? random.weighted({ walking_recovery: 4, rehabilitation: 4, training_safety: 1, health_services: 1 }) : null,
    duo_gs: gs,
    duo_gs_area: gs === 'yes' ? random.pick(['own_country', 'eea', 'eea_uk_switzerland', 'north_america']) : null,
    duo_mor: mor,
    duo_mor_months: mor === 'yes' ? random.pick([6, 12, 18, 24]) : null,
    duo_ts: ts,
    duo_ts_months: ts === 'yes' ? random.pick([24, 36, 60, 120]) : null,
    no_controls: flag(random, 5),
    no_aggregates: flag(random, 3),
  };
}

const tenYears = 3_653;

function consentRow(person: Person, number: number, studyDay: number, cells: Cells): DatedRow {
  return datedRow('consents', studyDay, { participant: person.code, consent_no: number, signed_day: studyDay }, cells);
}

export interface ConsentStory {
  /** Study day of the first consent, before everything else. */
  readonly firstDay: number;
  /** Study day on which a new consent replaces the first, if one does. */
  readonly renewedOn: number | undefined;
  /** Study day of the withdrawal, if there is one. */
  readonly withdrawnOn: number | undefined;
}

export function consentRows(random: Random, person: Person, { firstDay, renewedOn, withdrawnOn }: ConsentStory): DatedRow[] {
  const { permissions, formVersion } = person.site;
  const terms = termCells(random, person, random.weighted(permissions));
  const ends = random.chance(0.1);
  const first = {
    status: 'active',
    form_version: formVersion,
    valid_until_day: ends ? firstDay + tenYears : null,
    ...terms,
  };
  const rows = [consentRow(person, 1, firstDay, first)];
  let latest: Cells = first;
  if (renewedOn !== undefined) {
    // The newer form asks for research on the whole field and drops the limit of time.
    latest = {
      ...first,
      form_version: formVersion + 1,
      valid_until_day: null,
      permission: terms['permission'] === 'GRU' ? 'GRU' : 'HMB',
      condition: null,
      duo_ts: 'no',
      duo_ts_months: null,
    };
    rows.push(consentRow(person, rows.length + 1, renewedOn, latest));
  }
  if (withdrawnOn !== undefined) {
    const scope = random.weighted({ no_new_data: 4, no_further_use: 6, delete: 2 });
    rows.push(consentRow(person, rows.length + 1, withdrawnOn, { ...latest, status: 'withdrawn', withdrawal_scope: scope }));
  }
  return rows;
}
