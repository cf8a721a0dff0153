/** Heart rate and blood pressure around a session, and the episodes they show. */
import { isAtOrAboveT6, isCervical, isHighCervical } from '../people/person.ts';
import type { Person } from '../people/person.ts';
import type { Random } from '../random.ts';
import { clamp } from '../rows.ts';
import type { Cells } from '../rows.ts';

/** What is usual in one person. */
export interface Circulation {
  readonly systolic: number;
  readonly diastolic: number;
  readonly restingRate: number;
  readonly highestRate: number;
  /** Chance of a dysreflexia in one session. */
  readonly dysreflexia: number;
  /** Chance of a drop of pressure on standing in one session. */
  readonly hypotension: number;
}

export interface VitalSigns {
  readonly cells: Cells;
  readonly restingRate: number;
  readonly peakRate: number;
  /** The clinic decided that dysreflexia was present. */
  readonly dysreflexia?: { readonly rise: number; readonly peak: number };
  /** The clinic decided that orthostatic hypotension was present. */
  readonly hypotension?: { readonly systolic: number; readonly diastolic: number };
}

/** Resting pressure is 15 to 20 mmHg lower after high injuries, and a complete cervical injury limits the heart rate. */
export function drawCirculation(random: Random, person: Person): Circulation {
  const high = isAtOrAboveT6(person);
  const complete = person.grade === 'A' || person.grade === 'B';
  const systolic = Math.round(clamp(random.around(high ? 105 : 122, 8), 92, 142));
  return {
    systolic,
    diastolic: Math.round(clamp(systolic * random.between(0.58, 0.66), 56, 88)),
    restingRate: random.whole(56, 82),
    highestRate: complete && isCervical(person) ? random.whole(100, 118) : random.whole(112, 148),
    dysreflexia: high && random.chance(complete ? 0.4 : 0.12) ? random.between(0.01, 0.05) : 0,
    hypotension: random.chance(isHighCervical(person) ? 0.25 : 0.08) ? random.between(0.02, 0.08) : 0.001,
  };
}

const lowestSystolic = 76;
const lowestDiastolic = 43;

/** @param effort 0 to 1: how much of the usual work was done. */
export function drawVitalSigns(random: Random, usual: Circulation, effort: number, gaps: number): VitalSigns {
  const restingRate = usual.restingRate + random.whole(-5, 5);
  const peakRate = Math.max(restingRate + 8, Math.round(restingRate + (usual.highestRate - restingRate) * effort * random.between(0.7, 1)));
  const rates: Cells = {
    hr_rest: random.chance(gaps) ? null : restingRate,
    hr_peak: random.chance(gaps) ? null : peakRate,
  };
  const pressureMeasured = !random.chance(gaps * 1.5);
  if (!pressureMeasured) return { cells: rates, restingRate, peakRate };

  const sbpPre = usual.systolic + random.whole(-7, 7);
  const dbpPre = usual.diastolic + random.whole(-5, 5);
  let sbpPost = sbpPre + random.whole(-8, 14);
  const dbpPost = clamp(dbpPre + random.whole(-5, 6), lowestDiastolic, sbpPost - 20);
  const before: Cells = { sbp_pre: sbpPre, dbp_pre: dbpPre, bp_pre_posture: random.weighted({ sitting: 9, supine: 1 }) };

  let during: Cells = {};
  let dysreflexia: VitalSigns['dysreflexia'];
  let hypotension: VitalSigns['hypotension'];
  const rises = random.chance(usual.dysreflexia);
  const drops = !rises && random.chance(usual.hypotension);
  if (rises) {
    const rise = random.whole(20, 55);
    const present = rise >= 25 || random.chance(0.5);
    sbpPost = sbpPre + random.whole(0, 14);
    during = {
      sbp_max: sbpPre + rise,
      dbp_max: Math.max(dbpPost, dbpPre + Math.round(rise * 0.4)),
      dysreflexia_decision: present ? 'present' : random.pick(['absent', 'absent', 'not_assessed']),
    };
    if (present) dysreflexia = { rise, peak: sbpPre + rise };
  } else if (drops) {
    const sbpMin = Math.max(lowestSystolic, sbpPre - random.whole(20, 34));
    const dbpMin = clamp(dbpPre - random.whole(8, 16), lowestDiastolic, Math.min(dbpPost, sbpMin - 15));
    const present = sbpPre - sbpMin >= 20;
    during = {
      sbp_min: Math.min(sbpMin, sbpPost),
      dbp_min: dbpMin,
      bp_min_posture: random.pick(['standing', 'in_device']),
      bp_min_minute: random.whole(1, 3),
      hypotension_decision: present ? 'present' : 'absent',
    };
    if (present) hypotension = { systolic: sbpPre - sbpMin, diastolic: dbpPre - dbpMin };
  } else if (random.chance(0.35)) {
    const sbpMin = Math.max(lowestSystolic, Math.min(sbpPre - random.whole(0, 13), sbpPost));
    during = {
      sbp_max: Math.max(sbpPost, sbpPre + random.whole(2, 18)),
      dbp_max: Math.max(dbpPost, dbpPre + random.whole(0, 8)),
      sbp_min: sbpMin,
      dbp_min: clamp(dbpPre - random.whole(0, 8), lowestDiastolic, Math.min(dbpPost, sbpMin - 15)),
      bp_min_posture: random.pick(['standing', 'in_device']),
      bp_min_minute: random.whole(1, 12),
    };
  }
  const cells = { ...rates, ...before, ...during, sbp_post: sbpPost, dbp_post: dbpPost };
  return {
    cells,
    restingRate,
    peakRate,
    ...(dysreflexia ? { dysreflexia } : {}),
    ...(hypotension ? { hypotension } : {}),
  };
}
