/**
 * The invented people and site systems of the demonstration. The provider signs them in; which grants they hold is the
 * registry's business: its demonstration seed binds `role` and `site` to (issuer, subject).
 */

export type DemonstrationRole = 'coordinator' | 'therapist' | 'researcher' | 'steward' | 'administrator';

export interface DemonstrationPerson {
  /** What the provider calls the person, for good. */
  readonly subject: string;
  readonly name: string;
  readonly email: string;
  /** What the person does, in words for the sign-in page. */
  readonly label: string;
  /** The role the seed grants; null for a person whom nobody has granted anything. */
  readonly role: DemonstrationRole | null;
  /** Site code (S01 to S12) that the role is confined to; null for roles of the whole registry. */
  readonly site: string | null;
  /** Whom the person works for: a steward does not alone decide a request of their own institution. */
  readonly institution: string;
}

export const demonstrationPeople: readonly DemonstrationPerson[] = [
  {
    subject: 'demo-coordinator-alder',
    name: 'Mira Okafor',
    email: 'mira.okafor@alder-ridge.example',
    label: 'Site coordinator, Alder Ridge Rehabilitation',
    role: 'coordinator',
    site: 'S01',
    institution: 'Alder Ridge Rehabilitation',
  },
  {
    subject: 'demo-therapist-alder',
    name: 'Jonas Lindqvist',
    email: 'jonas.lindqvist@alder-ridge.example',
    label: 'Treating therapist, Alder Ridge Rehabilitation',
    role: 'therapist',
    site: 'S01',
    institution: 'Alder Ridge Rehabilitation',
  },
  {
    subject: 'demo-coordinator-fennmoor',
    name: 'Paulo Serrano',
    email: 'paulo.serrano@fennmoor-spinal.example',
    label: 'Site coordinator, Fennmoor Spinal Centre',
    role: 'coordinator',
    site: 'S02',
    institution: 'Fennmoor Spinal Centre',
  },
  {
    subject: 'demo-researcher',
    name: 'Anneke Visser',
    email: 'anneke.visser@gait-institute.example',
    label: 'Researcher, Institute for Gait Research',
    role: 'researcher',
    site: null,
    institution: 'Institute for Gait Research',
  },
  {
    subject: 'demo-steward',
    name: 'Tomas Hale',
    email: 'tomas.hale@registry-office.example',
    label: 'Data steward, registry office',
    role: 'steward',
    site: null,
    institution: 'Registry office',
  },
  {
    subject: 'demo-steward-second',
    name: 'Ines Calder',
    email: 'ines.calder@northmoor-university.example',
    label: 'Data steward, Northmoor University',
    role: 'steward',
    site: null,
    institution: 'Northmoor University',
  },
  {
    subject: 'demo-administrator',
    name: 'Ruth Adeyemi',
    email: 'ruth.adeyemi@registry-office.example',
    label: 'Administrator, registry office',
    role: 'administrator',
    site: null,
    institution: 'Registry office',
  },
  {
    subject: 'demo-no-grant',
    name: 'Felix Brandt',
    email: 'felix.brandt@elsewhere.example',
    label: 'A person whom nobody has granted anything',
    role: null,
    site: null,
    institution: 'Elsewhere',
  },
];

export interface DemonstrationSystem {
  /** The provider's client id, which is also the subject of the system's access tokens. */
  readonly clientId: string;
  readonly label: string;
  /** Site code that the system is confined to. */
  readonly site: string;
}

/** Sites' own systems that submit without a person. Their secret is made at the first start, never written here. */
export const demonstrationSystems: readonly DemonstrationSystem[] = [
  { clientId: 'demo-system-alder', label: 'Training records system, Alder Ridge Rehabilitation', site: 'S01' },
];
