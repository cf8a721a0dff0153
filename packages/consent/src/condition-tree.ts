/**
 * Conditions a consent or a request can name, and which contains which. A small tree of the registry's own: the ids of the larger
 * vocabularies (MONDO, MeSH) are to be checked by a person before they are added.
 */

/** Child to parent; a root has none. Codes as in the consents of the data dictionary, and those a request may name besides. */
export interface ConditionTree {
  readonly [condition: string]: { readonly label: string; readonly parent?: string };
}

export const conditionTree = {
  nervous_system: { label: 'disorder of the nervous system' },
  spinal_cord_disorder: { label: 'disorder of the spinal cord', parent: 'nervous_system' },
  spinal_cord_injury: { label: 'spinal cord injury', parent: 'spinal_cord_disorder' },
  traumatic_sci: { label: 'traumatic spinal cord injury', parent: 'spinal_cord_injury' },
  non_traumatic_sci: { label: 'non-traumatic spinal cord injury', parent: 'spinal_cord_injury' },
  cervical_sci: { label: 'traumatic cervical spinal cord injury', parent: 'traumatic_sci' },
  thoracic_sci: { label: 'traumatic thoracic spinal cord injury', parent: 'traumatic_sci' },
  lumbosacral_sci: { label: 'traumatic lumbosacral spinal cord injury', parent: 'traumatic_sci' },
  transverse_myelitis: { label: 'transverse myelitis', parent: 'spinal_cord_disorder' },
  stroke: { label: 'stroke', parent: 'nervous_system' },
  multiple_sclerosis: { label: 'multiple sclerosis', parent: 'nervous_system' },
  neuropathic_pain: { label: 'neuropathic pain', parent: 'nervous_system' },
  musculoskeletal: { label: 'disorder of muscles, bones or joints' },
  osteoporosis: { label: 'osteoporosis', parent: 'musculoskeletal' },
} as const satisfies ConditionTree;

/**
 * The condition itself and everything that contains it, nearest first; `undefined` when the tree does not know it.
 *
 * @throws RangeError when the tree names a parent it lacks, or goes in a circle
 */
export function pathToRoot(tree: ConditionTree, condition: string): string[] | undefined {
  if (!Object.hasOwn(tree, condition)) return undefined;
  const path: string[] = [];
  for (let at: string | undefined = condition; at !== undefined; at = tree[at]?.parent) {
    if (path.includes(at) || !Object.hasOwn(tree, at)) throw new RangeError('The condition tree has a gap or a circle.');
    path.push(at);
  }
  return path;
}
