/** How computed figures are held against published ones. Used by the unit tests and by the table of evidence. */

/** Passes when got equals want, or both are finite and |got - want| <= abs + rel |want|. `fields` loosens the rule for a member of the expected value and all under it. */
export interface Tolerance {
  readonly rel?: number;
  readonly abs?: number;
  readonly fields?: Readonly<Record<string, { readonly rel?: number; readonly abs?: number }>>;
}

/** One published figure (or a group of figures) and the call of this package that should reproduce it. */
export interface ReferenceCheck {
  /** Which case of the fixture, for the test report. */
  readonly id: string;
  /** Slug of the method page this check speaks for. */
  readonly method: string;
  /** Where the expected figures come from: software and version with data set, paper, or certified set. */
  readonly source: string;
  readonly compute: () => unknown;
  /** Number, or nested lists and records of them; only the members named here are compared. */
  readonly expected: unknown;
  readonly tolerance: Tolerance;
}

export interface Disagreement {
  readonly path: string;
  readonly got: unknown;
  readonly want: unknown;
}

export interface Agreement {
  readonly disagreements: readonly Disagreement[];
  /** Largest |got - want| / |want| over the numbers compared; absolute where a published figure is 0. */
  readonly worstRelativeError: number;
  /** The same for each member of the expected value; for a bare number under ''. Members without numbers are not in it. */
  readonly worstByMember: Readonly<Record<string, number>>;
  readonly compared: number;
}

/** Infinite where one of the two is no finite number and they are not the same. */
export function relativeError(got: number, want: number): number {
  if (got === want) return 0;
  if (!Number.isFinite(got) || !Number.isFinite(want)) return Infinity;
  return want === 0 ? Math.abs(got) : Math.abs(got - want) / Math.abs(want);
}

/** Digits agreed (log relative error) as the NIST data sets use it: at most 15. */
export function digitsOfError(error: number): number {
  return error === 0 ? 15 : Math.min(15, Math.max(0, -Math.log10(error)));
}

export function digitsAgreed(got: number, certified: number): number {
  return digitsOfError(relativeError(got, certified));
}

/** Fixtures spell what JSON cannot: "Infinity" and "-Infinity". */
function asNumber(value: unknown): unknown {
  return value === 'Infinity' ? Infinity : value === '-Infinity' ? -Infinity : value;
}

export function agreement(check: ReferenceCheck): Agreement {
  const disagreements: Disagreement[] = [];
  const worstByMember: Record<string, number> = {};
  let compared = 0;

  function compare(got: unknown, wanted: unknown, path: string, rel: number, abs: number): void {
    const want = asNumber(wanted);
    const looser = check.tolerance.fields?.[path];
    if (looser) [rel, abs] = [looser.rel ?? 0, looser.abs ?? 0];
    if (typeof want === 'object' && want !== null) {
      if (Array.isArray(want) && (got as ArrayLike<unknown> | undefined)?.length !== want.length) {
        disagreements.push({ path, got, want });
        return;
      }
      for (const [key, member] of Object.entries(want)) {
        compare((got as Record<string, unknown> | undefined)?.[key], member, path === '' ? key : `${path}.${key}`, rel, abs);
      }
      return;
    }
    compared++;
    if (typeof want !== 'number' || typeof got !== 'number') {
      if (got !== want) disagreements.push({ path, got, want });
      return;
    }
    const error = relativeError(got, want);
    const [member = ''] = path.split('.');
    worstByMember[member] = Math.max(worstByMember[member] ?? 0, error);
    const isWithin = got === want || (Number.isFinite(error) && Math.abs(got - want) <= abs + rel * Math.abs(want));
    if (!isWithin) disagreements.push({ path, got, want });
  }

  compare(check.compute(), check.expected, '', check.tolerance.rel ?? 0, check.tolerance.abs ?? 0);
  return { disagreements, worstRelativeError: Math.max(0, ...Object.values(worstByMember)), worstByMember, compared };
}
