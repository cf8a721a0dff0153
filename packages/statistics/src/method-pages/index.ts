/** All method pages, in the order the Methods page lists them. One file per method. */
import type { MethodPage } from './method-page.ts';

export type { MethodPage } from './method-page.ts';

export const methodPages: readonly MethodPage[] = [];
