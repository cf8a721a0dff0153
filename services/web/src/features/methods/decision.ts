import type { ComponentType } from 'react';

/** Something the registry decides itself, with the page that states it. */
export interface Decision {
  readonly slug: string;
  readonly title: string;
  /** In one or two sentences; stands on the index and on top of the page. */
  readonly summary: string;
  /** For the margin beside the title. */
  readonly note?: string;
  /** Sections of the page. */
  readonly Body: ComponentType;
}
