/** The twelve clinics of the invented consortium and their habits. Names and places are made up. */

export type DeviceClass =
  | 'treadmill_driven_orthosis'
  | 'overground_powered_exoskeleton'
  | 'signal_driven_exoskeleton'
  | 'end_effector_trainer'
  | 'manual_bwstt'
  | 'overground_bws'
  | 'fes_walking'
  | 'passive_orthosis'
  | 'conventional_overground';

export type Permission = 'NRES' | 'GRU' | 'HMB' | 'DS' | 'POA';

export interface SiteProfile {
  readonly code: string;
  readonly name: string;
  /** Months by which the site joined after the registry's first month. */
  readonly joinedAfter: number;
  /** People who begin training in the registry's 24 months. */
  readonly participants: number;
  readonly devices: readonly DeviceClass[];
  /** Protocol of the 10-metre walk. */
  readonly timedDistance: 6 | 10;
  readonly start: 'static' | 'flying';
  /** Trials of each 10-metre walk. */
  readonly trials: 1 | 2;
  readonly exertionScale: 'cr10' | '6_20';
  readonly plannedMinutes: readonly number[];
  readonly perWeek: readonly number[];
  /** How the site's consent forms have turned out. */
  readonly permissions: Readonly<Record<Permission, number>>;
  /** Version of the consent form in the first month. */
  readonly formVersion: number;
  /** Share of optional cells that are left empty. */
  readonly gaps: number;
}

const open: SiteProfile['permissions'] = { NRES: 6, GRU: 56, HMB: 26, DS: 12, POA: 0 };
const health: SiteProfile['permissions'] = { NRES: 1, GRU: 16, HMB: 58, DS: 25, POA: 0 };
const narrow: SiteProfile['permissions'] = { NRES: 0, GRU: 8, HMB: 24, DS: 67, POA: 1 };

export const siteProfiles: readonly SiteProfile[] = [
  {
    code: 'S01',
    name: 'Alder Ridge Rehabilitation',
    joinedAfter: 0,
    participants: 64,
    devices: ['treadmill_driven_orthosis', 'signal_driven_exoskeleton', 'overground_powered_exoskeleton', 'conventional_overground'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: 'cr10',
    plannedMinutes: [60],
    perWeek: [3, 4, 5],
    permissions: health,
    formVersion: 2,
    gaps: 0.03,
  },
  {
    code: 'S02',
    name: 'Fennmoor Spinal Centre',
    joinedAfter: 0,
    participants: 60,
    devices: ['treadmill_driven_orthosis', 'manual_bwstt', 'overground_powered_exoskeleton'],
    timedDistance: 10,
    start: 'flying',
    trials: 1,
    exertionScale: '6_20',
    plannedMinutes: [45, 60],
    perWeek: [3, 5],
    permissions: open,
    formVersion: 1,
    gaps: 0.07,
  },
  {
    code: 'S03',
    name: 'Quillhaven Walking Clinic',
    joinedAfter: 0,
    participants: 72,
    devices: ['signal_driven_exoskeleton', 'overground_powered_exoskeleton', 'overground_bws', 'fes_walking'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: 'cr10',
    plannedMinutes: [60],
    perWeek: [4, 5],
    permissions: health,
    formVersion: 3,
    gaps: 0.02,
  },
  {
    code: 'S04',
    name: 'Stonewether Rehabilitation Hospital',
    joinedAfter: 0,
    participants: 38,
    devices: ['treadmill_driven_orthosis', 'manual_bwstt', 'passive_orthosis', 'conventional_overground'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: '6_20',
    plannedMinutes: [45],
    perWeek: [3, 5],
    permissions: narrow,
    formVersion: 1,
    gaps: 0.06,
  },
  {
    code: 'S05',
    name: 'Thistlemarch Clinic',
    joinedAfter: 0,
    participants: 46,
    devices: ['overground_powered_exoskeleton', 'signal_driven_exoskeleton', 'conventional_overground'],
    timedDistance: 10,
    start: 'flying',
    trials: 2,
    exertionScale: 'cr10',
    plannedMinutes: [60],
    perWeek: [2, 3],
    permissions: health,
    formVersion: 2,
    gaps: 0.04,
  },
  {
    code: 'S06',
    name: 'Wexholm Neurological Rehabilitation',
    joinedAfter: 0,
    participants: 58,
    devices: ['treadmill_driven_orthosis', 'end_effector_trainer', 'overground_powered_exoskeleton', 'overground_bws'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: '6_20',
    plannedMinutes: [45, 60],
    perWeek: [3, 5],
    permissions: open,
    formVersion: 4,
    gaps: 0.05,
  },
  {
    code: 'S07',
    name: 'Harrowmere Gait Centre',
    joinedAfter: 0,
    participants: 52,
    devices: ['signal_driven_exoskeleton', 'overground_powered_exoskeleton', 'manual_bwstt'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: 'cr10',
    plannedMinutes: [60],
    perWeek: [5],
    permissions: narrow,
    formVersion: 1,
    gaps: 0.03,
  },
  {
    code: 'S08',
    name: 'Ostrelwick Rehabilitation',
    joinedAfter: 0,
    participants: 34,
    devices: ['treadmill_driven_orthosis', 'fes_walking', 'conventional_overground'],
    timedDistance: 6,
    start: 'flying',
    trials: 1,
    exertionScale: '6_20',
    plannedMinutes: [30, 45],
    perWeek: [3, 5],
    permissions: health,
    formVersion: 2,
    gaps: 0.09,
  },
  {
    code: 'S09',
    name: 'Lindfarrow Rehabilitation Unit',
    joinedAfter: 0,
    participants: 48,
    devices: ['overground_powered_exoskeleton', 'manual_bwstt', 'overground_bws', 'conventional_overground'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: 'cr10',
    plannedMinutes: [60],
    perWeek: [3],
    permissions: health,
    formVersion: 1,
    gaps: 0.05,
  },
  {
    code: 'S10',
    name: 'Corrawen Bay Spinal Unit',
    joinedAfter: 3,
    participants: 44,
    devices: ['treadmill_driven_orthosis', 'signal_driven_exoskeleton', 'overground_powered_exoskeleton'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: 'cr10',
    plannedMinutes: [60],
    perWeek: [3, 4],
    permissions: open,
    formVersion: 1,
    gaps: 0.04,
  },
  {
    code: 'S11',
    name: 'Mossgarth Point Rehabilitation',
    joinedAfter: 5,
    participants: 46,
    devices: ['treadmill_driven_orthosis', 'end_effector_trainer', 'passive_orthosis', 'conventional_overground'],
    timedDistance: 10,
    start: 'flying',
    trials: 1,
    exertionScale: '6_20',
    plannedMinutes: [45],
    perWeek: [4, 5],
    permissions: narrow,
    formVersion: 2,
    gaps: 0.06,
  },
  {
    code: 'S12',
    name: 'Pellanby Therapy Centre',
    joinedAfter: 8,
    participants: 38,
    devices: ['overground_powered_exoskeleton', 'signal_driven_exoskeleton', 'fes_walking', 'overground_bws'],
    timedDistance: 10,
    start: 'static',
    trials: 1,
    exertionScale: 'cr10',
    plannedMinutes: [60],
    perWeek: [3, 4],
    permissions: health,
    formVersion: 1,
    gaps: 0.05,
  },
];
