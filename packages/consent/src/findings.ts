/** Collects what speaks against a use, what a person has to settle, and what is owed. */
import type { IsoDate } from './iso-date.ts';
import type { DutyCode, ReasonCode } from './reasons.ts';

export interface Duty {
  readonly code: DutyCode;
  /** Last day for it, or first day on which it no longer binds (`no_publication_before_date`). */
  readonly date?: IsoDate;
}

export interface Findings {
  readonly refuse: (code: ReasonCode) => void;
  readonly ask: (code: ReasonCode) => void;
  readonly owe: (code: DutyCode, date?: IsoDate) => void;
}

export type Verdict = 'permitted' | 'not_permitted' | 'manual_review';

export interface UseDecision {
  readonly verdict: Verdict;
  /** Why not, or what a person has to settle; sorted, empty when permitted. */
  readonly reasons: readonly ReasonCode[];
  /** What the user owes; sorted, empty unless permitted. */
  readonly duties: readonly Duty[];
}

/** A refusal wins over an open question, an open question over a permission. */
export function decisionFrom(collect: (findings: Findings) => void): UseDecision {
  const refused = new Set<ReasonCode>();
  const open = new Set<ReasonCode>();
  const owed = new Map<string, Duty>();
  collect({
    refuse: (code) => void refused.add(code),
    ask: (code) => void open.add(code),
    owe: (code, date) => void owed.set(`${code} ${date ?? ''}`, date === undefined ? { code } : { code, date }),
  });
  if (refused.size > 0) return { verdict: 'not_permitted', reasons: [...refused].sort(), duties: [] };
  if (open.size > 0) return { verdict: 'manual_review', reasons: [...open].sort(), duties: [] };
  const sorted = [...owed.entries()].sort(([a], [b]) => (a < b ? -1 : 1));
  return { verdict: 'permitted', reasons: [], duties: sorted.map(([, duty]) => duty) };
}
