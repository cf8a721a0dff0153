/** Kinds of record numbers. A code is made for a number of one kind, so that the kind is fixed with the key. */
export const idTypes = [
  { value: 'mrn', label: 'Hospital record number' },
  { value: 'department-number', label: 'Number of the therapy department' },
  { value: 'registry-number', label: 'Number given for the registry alone' },
] as const;

/** A key made elsewhere may have a kind of its own. */
export const nameOfIdType = (idType: string): string => idTypes.find(({ value }) => value === idType)?.label ?? idType;
