import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { matchingCases, useOf, usualUse } from '../reference/matching-cases.ts';
import type { ConsentModifier, ConsentRecord, IntendedUse, LastDay, ModifierCode, PermissionCode, Purpose } from './index.ts';
import { conditionTree, decideUse, defaultPolicy, duties, purposes, reasons, terms } from './index.ts';

const active = (permission: PermissionCode, modifiers: readonly ConsentModifier[] = [], conditions?: readonly string[]): ConsentRecord => ({
  status: 'active',
  permissions: [conditions === undefined ? { code: permission } : { code: permission, conditions }],
  modifiers,
});
const use = (purpose: Purpose, differing: Partial<IntendedUse> = {}): IntendedUse => ({
  ...usualUse,
  purpose,
  conditions: [],
  ...differing,
});
const research = (differing: Partial<IntendedUse> = {}) => use('condition_research', { conditions: ['thoracic_sci'], ...differing });

describe('decideUse', () => {
  it.each(matchingCases)('$id: $says', (known) => {
    const decision = decideUse(known.consent, useOf(known));
    expect(decision.verdict).toBe(known.verdict);
    expect(decision.reasons).toEqual([...known.reasons].sort());
    expect(decision.duties.map(({ code }) => code)).toEqual([...known.duties].sort());
  });

  // Rows of the table in purpose-rules.ts: NRES, GRU, HMB, DS on a condition that contains the one asked for, POA.
  it.each<[Purpose, string, string, string, string, string]>([
    ['condition_research', 'permitted', 'permitted', 'permitted', 'permitted', 'not_permitted'],
    ['methods_development', 'permitted', 'permitted', 'permitted', 'permitted', 'not_permitted'],
    ['control_set', 'permitted', 'permitted', 'permitted', 'permitted', 'not_permitted'],
    ['ancestry', 'permitted', 'permitted', 'not_permitted', 'not_permitted', 'permitted'],
    ['social_science', 'permitted', 'permitted', 'not_permitted', 'not_permitted', 'not_permitted'],
    ['clinical_care', 'permitted', 'not_permitted', 'not_permitted', 'not_permitted', 'not_permitted'],
    ['not_research', 'manual_review', 'not_permitted', 'not_permitted', 'not_permitted', 'not_permitted'],
  ])('holds %s against each permission', (purpose, ...expected) => {
    const permissions: readonly PermissionCode[] = ['NRES', 'GRU', 'HMB', 'DS', 'POA'];
    const asked = use(purpose, { conditions: ['thoracic_sci'] });
    const verdicts = permissions.map(
      (code) => decideUse(active(code, [], code === 'DS' ? ['spinal_cord_injury'] : undefined), asked).verdict,
    );
    expect(verdicts).toEqual(expected);
  });

  it('reaches biomedical research on no condition by NRES, GRU and HMB only', () => {
    const asked = use('biomedical_research');
    expect((['NRES', 'GRU', 'HMB', 'POA'] as const).map((code) => decideUse(active(code), asked).verdict)).toEqual([
      'permitted',
      'permitted',
      'permitted',
      'not_permitted',
    ]);
    expect(decideUse(active('DS', [], ['spinal_cord_injury']), asked).reasons).toEqual(['no_condition_stated']);
  });

  it('reaches a condition and what it contains, never what contains it', () => {
    const consent = active('DS', [], ['traumatic_sci']);
    const asking = (condition: string) => decideUse(consent, use('condition_research', { conditions: [condition] })).verdict;
    expect(['traumatic_sci', 'cervical_sci'].map(asking)).toEqual(['permitted', 'permitted']);
    expect(['spinal_cord_injury', 'nervous_system', 'stroke'].map(asking)).toEqual(['not_permitted', 'not_permitted', 'not_permitted']);
  });

  it('needs CC for care, and the condition with it', () => {
    const care = use('clinical_care', { conditions: ['thoracic_sci'] });
    expect(decideUse(active('HMB', [{ code: 'CC' }]), care).verdict).toBe('permitted');
    expect(decideUse(active('DS', [{ code: 'CC' }], ['stroke']), care).reasons).toEqual(['condition_not_covered']);
    expect(decideUse(active('POA', [{ code: 'CC' }]), care).reasons).toEqual(['purpose_outside_permission']);
  });

  it('keeps NPU, NCU and NPUNCU apart: the first looks at the users, the second at the purpose, the third at both', () => {
    const company = research({ organisations: ['for_profit'] });
    const selling = research({ hasCommercialPurpose: true });
    const verdicts = (asked: IntendedUse) =>
      (['NPU', 'NCU', 'NPUNCU'] as const).map((code) => decideUse(active('GRU', [{ code }]), asked).verdict);
    expect(verdicts(company)).toEqual(['not_permitted', 'permitted', 'not_permitted']);
    expect(verdicts(selling)).toEqual(['permitted', 'not_permitted', 'not_permitted']);
    expect(verdicts(research())).toEqual(['permitted', 'permitted', 'permitted']);
  });

  it('asks when nobody says which organisations take part', () => {
    expect(decideUse(active('GRU', [{ code: 'NPU' }]), research({ organisations: [] })).reasons).toEqual(['organisation_type_unknown']);
  });

  it('lets genetic studies through GSO and nothing else', () => {
    const consent = active('GRU', [{ code: 'GSO' }]);
    expect(decideUse(consent, research({ genetics: 'genotype_and_phenotype' })).verdict).toBe('permitted');
    expect(decideUse(consent, research()).reasons).toEqual(['not_a_genetic_study']);
  });

  it('permits the coded kind of research, refuses another, and asks about a mixture or about nothing', () => {
    const consent = active('GRU', [{ code: 'RS', researchType: { value: 'walking_recovery', coded: true } }]);
    const decide = (researchTypes: readonly string[]) => decideUse(consent, research({ researchTypes }));
    expect(decide(['walking_recovery']).verdict).toBe('permitted');
    expect(decide(['health_services']).verdict).toBe('not_permitted');
    expect(decide(['walking_recovery', 'health_services']).reasons).toEqual(['research_type_needs_reading']);
    expect(decide([]).reasons).toEqual(['research_type_needs_reading']);
  });

  it('counts access from the first day, that day included', () => {
    const consent = active('GRU', [{ code: 'TS', months: 12 }]);
    expect(decideUse(consent, research({ months: 12 }))).toEqual({
      verdict: 'permitted',
      reasons: [],
      duties: [{ code: 'stop_at_time_limit', date: '2027-01-14' }],
    });
    expect(decideUse(consent, research({ months: 13 })).reasons).toEqual(['longer_than_time_limit']);
    const laterCheck = research({ decisionDate: '2026-11-03', accessStart: '2026-01-15' });
    expect(decideUse(consent, laterCheck).duties).toEqual([{ code: 'stop_at_time_limit', date: '2027-01-14' }]);
  });

  it('takes a moratorium as a date or as months from the first day of access, and allows publication on that day', () => {
    const byDate = active('GRU', [{ code: 'MOR', until: '2027-12-31' }]);
    const byMonths = active('GRU', [{ code: 'MOR', months: 18 }]);
    expect(decideUse(byDate, research({ plannedPublication: '2027-12-31' })).duties).toEqual([
      { code: 'no_publication_before_date', date: '2027-12-31' },
    ]);
    expect(decideUse(byMonths, research()).duties).toEqual([{ code: 'no_publication_before_date', date: '2027-07-15' }]);
    expect(decideUse(byMonths, research({ plannedPublication: '2027-07-14' })).reasons).toEqual(['publication_before_moratorium']);
  });

  it('accepts ethics approval and consent that end on the decision day, and owes their renewal or the stop', () => {
    const consent: ConsentRecord = {
      ...active('GRU', [{ code: 'IRB' }]),
      lastDay: { earliest: '2026-01-15', latest: '2026-01-15' },
    };
    expect(decideUse(consent, research({ ethicsApproval: { lastDay: '2026-01-15' } })).duties).toEqual([
      { code: 'renew_ethics', date: '2026-01-15' },
      { code: 'stop_at_consent_end', date: '2026-01-15' },
    ]);
    expect(decideUse(consent, research({ decisionDate: '2026-01-16' })).reasons).toEqual(['consent_expired']);
  });

  it('asks when the end of a consent is known in study days only', () => {
    const between = (earliest: string, latest: string) => decideUse({ ...active('GRU'), lastDay: { earliest, latest } }, research());
    expect(between('2026-01-10', '2026-02-10').reasons).toEqual(['consent_end_uncertain']);
    expect(between('2026-01-15', '2026-02-10').verdict).toBe('permitted');
    expect(between('2025-12-01', '2026-01-14').reasons).toEqual(['consent_expired']);
    expect(decideUse({ ...active('GRU'), lastDay: 'unknown' }, research()).reasons).toEqual(['consent_end_uncertain']);
  });

  it('refuses whoever is not on the approved list, and a request that names nobody', () => {
    const consent = active('GRU', [{ code: 'US', approved: ['u1', 'u2'] }]);
    expect(decideUse(consent, research({ users: ['u2'] })).verdict).toBe('permitted');
    expect(decideUse(consent, research({ users: [] })).reasons).toEqual(['user_not_approved']);
    expect(decideUse(consent, research()).reasons).toEqual(['user_not_approved']);
  });

  it('turns accepted duties into duties', () => {
    const consent = active('GRU', [{ code: 'RTN' }, { code: 'COL' }]);
    expect(decideUse(consent, research({ agreesToReturn: true, agreesToCollaborate: true })).duties).toEqual([
      { code: 'collaborate' },
      { code: 'return_results' },
    ]);
    expect(decideUse(consent, research({ agreesToReturn: true })).reasons).toEqual(['duty_not_answered']);
  });

  it('applies local flags: no controls for other conditions, no general aggregates', () => {
    expect(decideUse(active('HMB', [{ code: 'NCTRL' }]), use('control_set', { conditions: ['stroke'] })).reasons).toEqual([
      'control_use_forbidden',
    ]);
    const own = active('DS', [{ code: 'NCTRL' }], ['spinal_cord_injury']);
    expect(decideUse(own, use('control_set', { conditions: ['thoracic_sci'] })).verdict).toBe('permitted');
    const noAggregates = active('GRU', [{ code: 'NAGR' }]);
    expect(decideUse(noAggregates, research({ isGeneralAggregate: true })).reasons).toEqual(['aggregate_use_forbidden']);
    expect(decideUse(noAggregates, research()).verdict).toBe('permitted');
  });

  it('reads shorthand, id and either IRI of a term, and asks about obsolete, structural and misplaced ones', () => {
    const forbidding = ['NPOA', 'DUO:0000044', 'http://purl.obolibrary.org/obo/DUO_0000044', 'http://purl.obolibrary.org/obo/DUO_00000044'];
    for (const code of forbidding) expect(decideUse(active('GRU', [{ code }]), use('ancestry')).reasons).toEqual(['ancestry_forbidden']);
    const strange = ['GRU-CC', 'DUO:0000005', 'DUO:0000014', 'DUO:0000001', 'DUO:0000017', 'NPU', 'something'];
    for (const code of strange) {
      const consent: ConsentRecord = { status: 'active', permissions: [{ code }], modifiers: [] };
      expect(decideUse(consent, research()).reasons).toEqual(['unknown_code']);
    }
    expect(decideUse(active('GRU', [{ code: 'HMB' }]), research()).reasons).toEqual(['unknown_code']);
  });

  it('takes two permissions of one kind together', () => {
    const consent: ConsentRecord = {
      status: 'active',
      permissions: [
        { code: 'DS', conditions: ['traumatic_sci'] },
        { code: 'DUO:0000007', conditions: ['stroke'] },
      ],
      modifiers: [],
    };
    expect(decideUse(consent, use('condition_research', { conditions: ['stroke', 'cervical_sci'] })).verdict).toBe('permitted');
  });

  it('asks about a consented condition that the tree does not know, unless it is the very one', () => {
    const consent = active('DS', [], ['syringomyelia']);
    expect(decideUse(consent, use('condition_research', { conditions: ['syringomyelia'] })).verdict).toBe('permitted');
    expect(decideUse(consent, research()).reasons).toEqual(['condition_not_in_tree']);
  });

  it('follows policy on methods under a consent for a condition', () => {
    const consent = active('DS', [], ['spinal_cord_injury']);
    const cautious = { ...defaultPolicy, methodsUnderConditionConsent: 'manual_review' } as const;
    const methods = (conditions: readonly string[]) => use('methods_development', { conditions });
    expect(decideUse(consent, methods([])).verdict).toBe('permitted');
    expect(decideUse(consent, methods([]), cautious).reasons).toEqual(['methods_outside_condition']);
    expect(decideUse(consent, methods(['stroke']), cautious).reasons).toEqual(['methods_outside_condition']);
    expect(decideUse(consent, methods(['thoracic_sci']), cautious).verdict).toBe('permitted');
  });

  it('follows policy on data held when only new data were refused', () => {
    const consent: ConsentRecord = { ...active('GRU'), status: 'withdrawn', withdrawalScope: 'no_new_data' };
    const keeping = { ...defaultPolicy, heldDataAfterWithdrawal: 'as_consented' } as const;
    expect(decideUse(consent, research()).reasons).toEqual(['consent_withdrawn']);
    expect(decideUse(consent, research(), keeping).verdict).toBe('permitted');
    expect(decideUse({ ...consent, withdrawalScope: 'delete' }, research(), keeping).reasons).toEqual(['consent_withdrawn']);
  });

  it('refuses a consent that is not in force without looking further', () => {
    const consent: ConsentRecord = { ...active('POA', [{ code: 'GSO' }]), status: 'withdrawn' };
    expect(decideUse(consent, research()).reasons).toEqual(['consent_withdrawn']);
    expect(decideUse({ ...consent, status: 'expired' }, research()).reasons).toEqual(['consent_expired']);
  });

  it('stops at malformed dates, months and trees', () => {
    expect(() => decideUse(undefined, research({ decisionDate: '15.01.2026' }))).toThrow(RangeError);
    expect(() => decideUse(undefined, research({ decisionDate: '2026-02-30' }))).toThrow(RangeError);
    expect(() => decideUse(active('GRU'), research({ months: 0.5 }))).toThrow(RangeError);
    const circle = { a: { label: 'a', parent: 'b' }, b: { label: 'b', parent: 'a' }, thoracic_sci: { label: 'c', parent: 'a' } };
    expect(() => decideUse(active('DS', [], ['b2']), research(), { ...defaultPolicy, conditionTree: circle })).toThrow(RangeError);
  });

  it('has a text for every reason, duty, purpose and term', () => {
    for (const text of [...Object.values(reasons), ...Object.values(duties), ...Object.values(purposes)]) expect(text).not.toBe('');
    for (const term of Object.values(terms)) expect([term.label, term.meaning]).not.toContain('');
    const used = new Set(matchingCases.flatMap((known) => known.reasons));
    expect(
      Object.keys(reasons)
        .filter((code) => !used.has(code as keyof typeof reasons))
        .sort(),
    ).toEqual([
      // Registry decisions beyond the published cases, each with a test above.
      'aggregate_use_forbidden',
      'consent_end_uncertain',
      'methods_outside_condition',
    ]);
  });
});

describe('decideUse, whatever the consent and the use', () => {
  const conditions = Object.keys(conditionTree);
  const someConditions = fc.uniqueArray(fc.constantFrom(...conditions, 'not_in_the_tree'), { maxLength: 3 });
  const modifierCodes = Object.entries(terms).flatMap(([code, { kind }]) => (kind === 'permission' ? [] : [code as ModifierCode]));
  const anyModifier: fc.Arbitrary<ConsentModifier> = fc.record(
    {
      code: fc.constantFrom(...modifierCodes),
      researchType: fc.record({ value: fc.constantFrom('gait', 'pain'), coded: fc.boolean() }),
      countries: fc.subarray(['DE', 'NL', 'US']),
      until: fc.constantFrom('2026-06-01', '2028-01-01'),
      months: fc.integer({ min: 1, max: 36 }),
      approved: fc.subarray(['a', 'b', 'c']),
    },
    { requiredKeys: ['code'] },
  );
  const anyConsent: fc.Arbitrary<ConsentRecord> = fc.record(
    {
      status: fc.constantFrom('active', 'active', 'active', 'withdrawn', 'superseded', 'expired'),
      permissions: fc.array(
        fc.record(
          { code: fc.constantFrom('NRES', 'GRU', 'HMB', 'DS', 'POA', 'GRU-CC'), conditions: someConditions },
          { requiredKeys: ['code'] },
        ),
        { minLength: 0, maxLength: 2 },
      ),
      modifiers: fc.array(anyModifier, { maxLength: 4 }),
      lastDay: fc.constantFrom<LastDay | 'unknown'>(
        { earliest: '2026-01-01', latest: '2026-03-01' },
        { earliest: '2027-01-01', latest: '2027-01-01' },
        'unknown',
      ),
    },
    { requiredKeys: ['status', 'permissions', 'modifiers'] },
  );
  const anyUse: fc.Arbitrary<IntendedUse> = fc.record(
    {
      purpose: fc.constantFrom(...(Object.keys(purposes) as Purpose[])),
      conditions: someConditions,
      claimsRelatedCondition: fc.boolean(),
      hasHealthLink: fc.boolean(),
      researchTypes: fc.subarray(['gait', 'pain']),
      genetics: fc.constantFrom('none', 'genotype', 'genotype_and_phenotype'),
      isGeneralAggregate: fc.boolean(),
      organisations: fc.array(fc.constantFrom('not_for_profit', 'for_profit', 'unknown'), { maxLength: 2 }),
      hasCommercialPurpose: fc.constantFrom<boolean | 'unclear'>(true, false, 'unclear'),
      countries: fc.subarray(['DE', 'NL', 'US']),
      users: fc.subarray(['a', 'b', 'd']),
      projects: fc.subarray(['a', 'b', 'd']),
      institutions: fc.subarray(['a', 'b', 'd']),
      ethicsApproval: fc.record({ lastDay: fc.constantFrom('2026-01-14', '2026-09-30', '2028-01-01') }),
      agreesToPublish: fc.boolean(),
      agreesToCollaborate: fc.boolean(),
      agreesToReturn: fc.boolean(),
      plannedPublication: fc.constantFrom('2026-07-01', '2029-01-01'),
      decisionDate: fc.constantFrom('2026-01-15', '2026-02-01'),
      months: fc.integer({ min: 1, max: 36 }),
    },
    {
      requiredKeys: ['purpose', 'conditions', 'genetics', 'organisations', 'hasCommercialPurpose', 'countries', 'decisionDate', 'months'],
    },
  );
  const policies = fc.record({
    conditionTree: fc.constant(conditionTree),
    methodsUnderConditionConsent: fc.constantFrom('permitted', 'manual_review'),
    heldDataAfterWithdrawal: fc.constantFrom('left_out', 'as_consented'),
  });
  const runs = (seed: number) => ({ seed, numRuns: 1500 });

  it('does not turn a refusal into a permission, nor into a question, by one more modifier other than CC', () => {
    fc.assert(
      fc.property(anyConsent, anyUse, anyModifier, policies, (consent, asked, more, policy) => {
        fc.pre(more.code !== 'CC');
        if (decideUse(consent, asked, policy).verdict !== 'not_permitted') return;
        const narrower = { ...consent, modifiers: [...consent.modifiers, more] };
        expect(decideUse(narrower, asked, policy).verdict).toBe('not_permitted');
      }),
      runs(1),
    );
  });

  it('does not lose a permission when DS names the parent of a condition instead', () => {
    const parentOf = (condition: string) => conditionTree[condition as keyof typeof conditionTree] as { parent?: string } | undefined;
    const consents = fc.tuple(
      fc.uniqueArray(fc.constantFrom(...conditions), { minLength: 1, maxLength: 2 }),
      fc.array(anyModifier, { maxLength: 2 }),
    );
    fc.assert(
      fc.property(consents, anyUse, policies, ([named, modifiers], asked, policy) => {
        const wider = named.map((condition) => parentOf(condition)?.parent ?? condition);
        if (decideUse(active('DS', modifiers, named), asked, policy).verdict !== 'permitted') return;
        expect(decideUse(active('DS', modifiers, wider), asked, policy).verdict).toBe('permitted');
      }),
      runs(2),
    );
  });

  it('permits under GRU whatever it permits under HMB', () => {
    fc.assert(
      fc.property(fc.array(anyModifier, { maxLength: 3 }), anyUse, policies, (modifiers, asked, policy) => {
        if (decideUse(active('HMB', modifiers), asked, policy).verdict !== 'permitted') return;
        expect(decideUse(active('GRU', modifiers), asked, policy).verdict).toBe('permitted');
      }),
      runs(3),
    );
  });

  it('refuses every use once a consent is withdrawn', () => {
    fc.assert(
      fc.property(anyConsent, anyUse, (consent, asked) => {
        expect(decideUse({ ...consent, status: 'withdrawn' }, asked).verdict).toBe('not_permitted');
      }),
      runs(4),
    );
  });

  it('does not depend on the order of codes', () => {
    const shuffled = fc.tuple(anyConsent, fc.array(fc.nat(), { minLength: 4, maxLength: 4 })).map(([consent, keys]) => ({
      consent,
      modifiers: consent.modifiers
        .map((m, at) => ({ m, key: keys[at] ?? 0 }))
        .sort((a, b) => a.key - b.key)
        .map(({ m }) => m),
    }));
    fc.assert(
      fc.property(shuffled, anyUse, policies, ({ consent, modifiers }, asked, policy) => {
        const other = { ...consent, permissions: [...consent.permissions].reverse(), modifiers };
        expect(decideUse(other, asked, policy)).toEqual(decideUse(consent, asked, policy));
      }),
      runs(5),
    );
  });

  it('gives reasons unless it permits, and duties only if it does', () => {
    fc.assert(
      fc.property(fc.option(anyConsent, { nil: undefined }), anyUse, policies, (consent, asked, policy) => {
        const decision = decideUse(consent, asked, policy);
        expect(decision.reasons.length > 0).toBe(decision.verdict !== 'permitted');
        if (decision.verdict !== 'permitted') expect(decision.duties).toEqual([]);
      }),
      runs(6),
    );
  });
});
