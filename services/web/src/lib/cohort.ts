/** A cohort as cells of the grid: how the address holds it (`c5_c8.C.D-t1_t9.D`) and how it is said in words. */
import type { RequestForm } from '@cairnstep/contract';
import { grades } from '@cairnstep/contract';
import { levelGroups } from '@cairnstep/scoring';

export type Grade = (typeof grades)[number];

export interface CohortCell {
  /** Id of a level group of the registry, or `ND` where the level cannot be determined. */
  readonly levelGroup: string;
  readonly grade: Grade;
}

/** Level groups top down, then the row of people whose level cannot be determined; as the grid has them. */
const groups: readonly { readonly id: string; readonly label: string }[] = [
  ...levelGroups.groups,
  { id: 'ND', label: 'Level not determinable' },
];

export function levelGroupLabel(id: string): string {
  return groups.find((group) => group.id === id)?.label ?? id;
}

/** Cells in the grid's order, each once. What the registry does not know is left out, so that an old link still opens. */
export function parseCells(text: string | null): CohortCell[] {
  const chosen = new Map<string, Set<string>>();
  for (const part of (text ?? '').split('-')) {
    const [group = '', ...names] = part.split('.');
    chosen.set(group, new Set([...(chosen.get(group) ?? []), ...names]));
  }
  return groups.flatMap(({ id }) => grades.filter((grade) => chosen.get(id)?.has(grade)).map((grade) => ({ levelGroup: id, grade })));
}

/** Null when no cell is chosen, so that the parameter leaves the address. */
export function formatCells(cells: readonly CohortCell[]): string | null {
  const parts = byGroup(cells).map(({ levelGroup, grades: names }) => [levelGroup, ...names].join('.'));
  return parts.length === 0 ? null : parts.join('-');
}

/** The outcome that was looked at when the cells were chosen, and the cells; none means everyone. */
export type Cohort = RequestForm['cohort'];

/** The search parameters that stand for a cohort wherever it is carried along. */
export function cohortSearch({ outcome, inDevice, cells }: Cohort): URLSearchParams {
  const written = formatCells(cells);
  return new URLSearchParams({ outcome, ...(inDevice && { 'in-device': 'yes' }), ...(written !== null && { cells: written }) });
}

/** Null where the address names none. */
export function cohortIn(search: URLSearchParams): Cohort | null {
  const outcome = search.get('outcome');
  if (outcome === null || outcome === '') return null;
  return { outcome, inDevice: search.get('in-device') === 'yes', cells: parseCells(search.get('cells')) };
}

/** One phrase for each level group: "C5–C8: AIS C and D". */
export function cohortPhrases(cells: readonly CohortCell[]): string[] {
  return byGroup(cells).map(({ levelGroup, grades: names }) => `${levelGroupLabel(levelGroup)}: ${gradePhrase(names)}`);
}

function gradePhrase(names: readonly Grade[]): string {
  if (names.length === grades.length) return 'every grade';
  const known = names.filter((grade) => grade !== 'ND');
  const phrases = [...(known.length > 0 ? [`AIS ${inARow(known)}`] : []), ...(names.includes('ND') ? ['grade not determinable'] : [])];
  return phrases.join(' and ');
}

/** "A", "A and B", "A, B and C" */
function inARow(words: readonly string[]): string {
  const last = words.at(-1) ?? '';
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} and ${last}`;
}

function byGroup(cells: readonly CohortCell[]): { readonly levelGroup: string; readonly grades: readonly Grade[] }[] {
  const chosen = new Set(cells.map(({ levelGroup, grade }) => `${levelGroup} ${grade}`));
  return groups
    .map(({ id }) => ({ levelGroup: id, grades: grades.filter((grade) => chosen.has(`${id} ${grade}`)) }))
    .filter((group) => group.grades.length > 0);
}
