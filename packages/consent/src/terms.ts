/**
 * The terms of the GA4GH Data Use Ontology that a consent can carry, and two flags of consent forms that the ontology has no class for.
 *
 * Source: github EBISPOT/DUO, commit 81f5c3d9cc5a3e13614fdeaed53ace2496d7c095 (21 September 2022), version IRI
 * http://purl.obolibrary.org/obo/duo/releases/2021-02-23/duo.owl, licence CC BY 4.0; Lawson J et al. (2021), Cell Genomics
 * 1(2):100028. Ids, shorthands and labels are the ontology's; meanings are in our words.
 */

/** For the page that credits sources. */
export const dataUseOntology = {
  name: 'GA4GH Data Use Ontology (DUO)',
  version: 'http://purl.obolibrary.org/obo/duo/releases/2021-02-23/duo.owl',
  repository: 'https://github.com/EBISPOT/DUO',
  commit: '81f5c3d9cc5a3e13614fdeaed53ace2496d7c095',
  licence: 'CC BY 4.0',
} as const;

export interface Term {
  /** The ontology's id; local flags have none. */
  readonly id?: string;
  readonly kind: 'permission' | 'modifier' | 'local-flag';
  /** As the ontology names it. */
  readonly label: string;
  /** For people who give or weigh a consent; screens show it before the code. */
  readonly meaning: string;
  /** What the term must come with to mean anything. */
  readonly needs?: string;
}

export const terms = {
  NRES: { id: 'DUO:0000004', kind: 'permission', label: 'no restriction', meaning: 'The data may be used without limits.' },
  GRU: {
    id: 'DUO:0000042',
    kind: 'permission',
    label: 'general research use',
    meaning: 'Any research: health, biology, methods, society, ancestry. Patient care is not research.',
  },
  HMB: {
    id: 'DUO:0000006',
    kind: 'permission',
    label: 'health or medical or biomedical research',
    meaning: 'Research on health, medicine or biology, but not on population origins or ancestry.',
  },
  DS: {
    id: 'DUO:0000007',
    kind: 'permission',
    label: 'disease specific research',
    meaning: 'Research on a stated condition only, and on whatever that condition contains.',
    needs: 'one or more conditions',
  },
  POA: {
    id: 'DUO:0000011',
    kind: 'permission',
    label: 'population origins or ancestry research only',
    meaning: 'Research on population origins or ancestry and nothing else.',
  },
  RS: {
    id: 'DUO:0000012',
    kind: 'modifier',
    label: 'research specific restrictions',
    meaning: 'Only studies of a stated kind.',
    needs: 'the kind of research',
  },
  NMDS: {
    id: 'DUO:0000015',
    kind: 'modifier',
    label: 'no general methods research',
    meaning: 'Not for developing methods, software or algorithms as a purpose of its own.',
  },
  GSO: {
    id: 'DUO:0000016',
    kind: 'modifier',
    label: 'genetic studies only',
    meaning: 'Only studies that look at genes, with or without other traits.',
  },
  NPUNCU: {
    id: 'DUO:0000018',
    kind: 'modifier',
    label: 'not for profit, non commercial use only',
    meaning: 'Only not-for-profit users, and only for purposes free of profit.',
  },
  PUB: {
    id: 'DUO:0000019',
    kind: 'modifier',
    label: 'publication required',
    meaning: 'Results must be made available to the scientific public.',
  },
  COL: {
    id: 'DUO:0000020',
    kind: 'modifier',
    label: 'collaboration required',
    meaning: 'The user must work together with those who collected the data.',
  },
  IRB: {
    id: 'DUO:0000021',
    kind: 'modifier',
    label: 'ethics approval required',
    meaning: 'The user must show the approval of an ethics committee.',
  },
  GS: {
    id: 'DUO:0000022',
    kind: 'modifier',
    label: 'geographical restriction',
    meaning: 'Use must stay within a stated area.',
    needs: 'one or more countries',
  },
  MOR: {
    id: 'DUO:0000024',
    kind: 'modifier',
    label: 'publication moratorium',
    meaning: 'Results may not be published before a stated day.',
    needs: 'a date, or months from the day access is granted',
  },
  TS: {
    id: 'DUO:0000025',
    kind: 'modifier',
    label: 'time limit on use',
    meaning: 'Use is limited to a stated number of months.',
    needs: 'whole months',
  },
  US: {
    id: 'DUO:0000026',
    kind: 'modifier',
    label: 'user specific restriction',
    meaning: 'Only users named beforehand.',
    needs: 'the approved users',
  },
  PS: {
    id: 'DUO:0000027',
    kind: 'modifier',
    label: 'project specific restriction',
    meaning: 'Only within a project named beforehand.',
    needs: 'the approved projects',
  },
  IS: {
    id: 'DUO:0000028',
    kind: 'modifier',
    label: 'institution specific restriction',
    meaning: 'Only within institutions named beforehand.',
    needs: 'the approved institutions',
  },
  RTN: {
    id: 'DUO:0000029',
    kind: 'modifier',
    label: 'return to database or resource',
    meaning: 'Derived data must be given back to the registry.',
  },
  CC: {
    id: 'DUO:0000043',
    kind: 'modifier',
    label: 'clinical care use',
    meaning: 'Use in patient care is allowed as well. The one term that widens a permission.',
  },
  NPOA: {
    id: 'DUO:0000044',
    kind: 'modifier',
    label: 'population origins or ancestry research prohibited',
    meaning: 'No research on population origins or ancestry.',
  },
  NPU: {
    id: 'DUO:0000045',
    kind: 'modifier',
    label: 'not for profit organisation use only',
    meaning: 'Only users in not-for-profit organisations, whatever the purpose.',
  },
  NCU: {
    id: 'DUO:0000046',
    kind: 'modifier',
    label: 'non-commercial use only',
    meaning: 'Only purposes free of profit, whoever the user is.',
  },
  NCTRL: { kind: 'local-flag', label: 'not as a control', meaning: 'Not as a comparison group for research on another condition.' },
  NAGR: { kind: 'local-flag', label: 'not in general aggregates', meaning: 'Not in aggregate figures for general use.' },
} as const satisfies Readonly<Record<string, Term>>;

export type TermCode = keyof typeof terms;
type OfKind<Kind extends Term['kind']> = { [Code in TermCode]: (typeof terms)[Code]['kind'] extends Kind ? Code : never }[TermCode];
export type PermissionCode = OfKind<'permission'>;
export type ModifierCode = OfKind<'modifier'>;
export type LocalFlag = OfKind<'local-flag'>;

const iriStem = 'http://purl.obolibrary.org/obo/';
/** The ontology's file gives NPOA an IRI with a zero too many; its id and the CSV have the right one. Both are read. */
const misprintedIri = `${iriStem}DUO_00000044`;

const codeOf = new Map<string, TermCode>();
for (const [code, term] of Object.entries(terms) as [TermCode, Term][]) {
  codeOf.set(code, code);
  if (term.id === undefined) continue;
  codeOf.set(term.id, code);
  codeOf.set(iriStem + term.id.replace(':', '_'), code);
}
codeOf.set(misprintedIri, 'NPOA');

/**
 * The term a text stands for: its shorthand, id or IRI. `undefined` for anything else, the ontology's obsolete terms and structural
 * classes among it: they are never on a consent.
 */
export function termCodeOf(text: string): TermCode | undefined {
  return codeOf.get(text);
}
