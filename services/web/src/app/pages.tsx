/**
 * Every page of the client, in the order of the navigation: its address, who it is for, what it is called there, and the
 * module that holds it. Modules are fetched when first visited.
 */
import type { Role } from '@cairnstep/contract';
import type { ComponentType } from 'react';

/** `anyone`: public. `signed-in`: any role. A list: one of these roles. */
export type Audience = 'anyone' | 'signed-in' | readonly Role[];

export interface PageEntry {
  readonly path: string;
  readonly audience: Audience;
  /** Its word in the navigation; a page without one is reached from others. */
  readonly nav?: string;
  readonly load: () => Promise<{ readonly default: ComponentType }>;
}

export const pages: readonly PageEntry[] = [
  { path: '/', audience: 'anyone', nav: 'At a glance', load: () => import('../features/public/glance-page.tsx') },
  { path: '/participants', audience: 'anyone', nav: 'For participants', load: () => import('../features/public/participants-page.tsx') },
  {
    path: '/month',
    audience: ['coordinator', 'therapist'],
    nav: 'This month',
    load: () => import('../features/submissions/month-page.tsx'),
  },
  { path: '/dictionary', audience: 'anyone', nav: 'Dictionary', load: () => import('../features/dictionary/dictionary-page.tsx') },
  { path: '/dictionary/measures/:key', audience: 'anyone', load: () => import('../features/dictionary/measure-page.tsx') },
  { path: '/dictionary/:table/:column', audience: 'anyone', load: () => import('../features/dictionary/variable-page.tsx') },
  { path: '/desk', audience: ['steward'], nav: 'Desk', load: () => import('../features/requests/desk-page.tsx') },
  { path: '/desk/:requestId', audience: ['steward'], load: () => import('../features/requests/review-page.tsx') },
  { path: '/methods', audience: 'anyone', nav: 'Methods', load: () => import('../features/methods/methods-page.tsx') },
  { path: '/methods/:slug', audience: 'anyone', load: () => import('../features/methods/method-page.tsx') },
  {
    path: '/explore',
    audience: ['researcher', 'steward', 'coordinator', 'therapist'],
    nav: 'Explore',
    load: () => import('../features/explore/explore-page.tsx'),
  },
  { path: '/requests', audience: ['researcher'], nav: 'Access requests', load: () => import('../features/requests/requests-page.tsx') },
  { path: '/requests/new', audience: ['researcher'], load: () => import('../features/requests/new-request-page.tsx') },
  { path: '/requests/:requestId', audience: ['researcher', 'steward'], load: () => import('../features/requests/request-page.tsx') },
  { path: '/exports', audience: ['researcher'], nav: 'Exports', load: () => import('../features/exports/exports-page.tsx') },
  {
    path: '/releases',
    audience: ['steward', 'researcher', 'coordinator', 'therapist'],
    nav: 'Releases',
    load: () => import('../features/releases/releases-page.tsx'),
  },
  {
    path: '/submit/:submissionId',
    audience: ['coordinator', 'therapist', 'steward'],
    load: () => import('../features/submissions/submit-page.tsx'),
  },
  {
    path: '/submit/:submissionId/prepare',
    audience: ['coordinator', 'therapist', 'steward'],
    load: () => import('../features/submissions/prepare-page.tsx'),
  },
  { path: '/prepare-without-the-server', audience: 'anyone', load: () => import('../features/public/preparing-file-page.tsx') },
  {
    path: '/submissions',
    audience: ['coordinator', 'therapist', 'steward'],
    nav: 'Submissions',
    load: () => import('../features/submissions/submissions-page.tsx'),
  },
  {
    path: '/calendar',
    audience: ['steward', 'coordinator', 'therapist'],
    nav: 'Calendar',
    load: () => import('../features/months/calendar-page.tsx'),
  },
  { path: '/site-key', audience: ['coordinator'], nav: 'Site key', load: () => import('../features/submissions/site-key-page.tsx') },
  {
    path: '/submissions/:submissionId/receipt',
    audience: ['coordinator', 'therapist', 'steward'],
    load: () => import('../features/submissions/receipt-page.tsx'),
  },
  { path: '/people', audience: ['administrator', 'steward'], nav: 'People', load: () => import('../features/people/people-page.tsx') },
  { path: '/people/:personId', audience: ['administrator', 'steward'], load: () => import('../features/people/person-page.tsx') },
  {
    path: '/site-systems',
    audience: ['administrator', 'steward'],
    nav: 'Site systems',
    load: () => import('../features/site-systems/site-systems-page.tsx'),
  },
  {
    path: '/audit',
    audience: ['steward', 'administrator', 'coordinator', 'researcher'],
    nav: 'Audit',
    load: () => import('../features/audit/audit-page.tsx'),
  },
  { path: '/exam', audience: 'anyone', nav: 'Exam sheet', load: () => import('../features/exam/exam-page.tsx') },
  { path: '/sign-in', audience: 'anyone', load: () => import('../features/account/sign-in-page.tsx') },
  { path: '/invitation/:token', audience: 'anyone', load: () => import('../features/account/invitation-page.tsx') },
  { path: '/whom-to-ask', audience: 'anyone', load: () => import('../features/account/whom-to-ask-page.tsx') },
  { path: '/problems/:code', audience: 'anyone', load: () => import('../features/public/problem-page.tsx') },
  { path: '/developers', audience: 'anyone', load: () => import('../features/public/developers-page.tsx') },
];
