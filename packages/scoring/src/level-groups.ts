import type { NotDeterminable } from './assign-by-set.ts';
import { assignBySet } from './assign-by-set.ts';
import { place } from './level-bits.ts';
import type { Level } from './segments.ts';
import { levels } from './segments.ts';

/** A run of levels; `first` and `last` belong to it. */
export interface LevelGroup<Id extends string = string> {
  readonly id: Id;
  /** With its edges, as printed. */
  readonly label: string;
  readonly first: Level;
  readonly last: Level;
}

/** A versioned way of grouping all levels. A published figure names its id. */
export interface LevelGroups<Id extends string = string> {
  readonly id: string;
  readonly name: string;
  readonly groups: readonly LevelGroup<Id>[];
  /** The group of one level; undefined for anything that is not a level. */
  groupOf(level: string): Id | undefined;
  /** The group of a result, when every value it can have falls in it. */
  assign(values: readonly Level[]): Id | NotDeterminable;
}

function defineLevelGroups<Id extends string>(id: string, name: string, groups: readonly LevelGroup<Id>[]): LevelGroups<Id> {
  const byLevel = new Map<string, Id>();
  for (const level of levels) {
    const group = groups.find(({ first, last }) => place[first] <= place[level] && place[level] <= place[last]);
    if (group === undefined) throw new Error(`The level groups ${id} leave out ${level}.`);
    byLevel.set(level, group.id);
  }
  return {
    id,
    name,
    groups,
    groupOf: (level) => byLevel.get(level),
    assign: (values) => assignBySet(values, (level) => byLevel.get(level)!),
  };
}

const intact = { id: 'intact', label: 'Intact', first: 'INT', last: 'INT' } as const;

/** The registry's groups: the neck in the two parts of the international data sets, the usual thoracic split at T9/T10. */
export const levelGroups = defineLevelGroups('registry-1', 'Level groups of the registry', [
  { id: 'c1_c4', label: 'C1–C4', first: 'C1', last: 'C4' },
  { id: 'c5_c8', label: 'C5–C8', first: 'C5', last: 'C8' },
  { id: 't1_t9', label: 'T1–T9', first: 'T1', last: 'T9' },
  { id: 't10_t12', label: 'T10–T12', first: 'T10', last: 'T12' },
  { id: 'l1_l5', label: 'L1–L5', first: 'L1', last: 'L5' },
  { id: 's1_s3', label: 'S1–S3', first: 'S1', last: 'S3' },
  intact,
]);
export type LevelGroupId = (typeof levelGroups)['groups'][number]['id'];

export const regionGroups = defineLevelGroups('regions-1', 'Regions of the spine', [
  { id: 'cervical', label: 'Cervical, C1–C8', first: 'C1', last: 'C8' },
  { id: 'thoracic', label: 'Thoracic, T1–T12', first: 'T1', last: 'T12' },
  { id: 'lumbar', label: 'Lumbar, L1–L5', first: 'L1', last: 'L5' },
  { id: 'sacral', label: 'Sacral, S1–S3', first: 'S1', last: 'S3' },
  intact,
]);

export const plegiaGroups = defineLevelGroups('plegia-1', 'Tetraplegia and paraplegia', [
  { id: 'tetraplegia', label: 'Tetraplegia, C1–C8', first: 'C1', last: 'C8' },
  { id: 'paraplegia', label: 'Paraplegia, T1–S3', first: 'T1', last: 'S3' },
  intact,
]);

/**
 * The most rostral of several levels, such as the neurological level from the two sensory and two motor levels.
 * @throws RangeError when none is given.
 */
export function mostRostralLevel(found: readonly Level[]): Level {
  if (found.length === 0) throw new RangeError('The most rostral of no levels does not exist.');
  return levels[Math.min(...found.map((level) => place[level]))]!;
}
