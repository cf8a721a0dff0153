import { dictionary } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { headerCases } from '../../reference/identifier-cases.ts';
import { headerHits } from './header-rules.ts';

const written = (header: string) => headerHits(header).map((hit) => `${hit.class}:${hit.strength}`);

describe('headers', () => {
  it.each(headerCases)('announces in "$header": $expect', ({ header, expect: expected }) => {
    expect(written(header)).toEqual(expected);
  });

  it('finds nothing in any column of the dictionary', () => {
    const keys = dictionary.tables.flatMap(({ variables }) => variables.map(({ key }) => key));
    expect(keys.filter((key) => written(key).length > 0)).toEqual([]);
  });

  it.each([
    ["patient's name", 'person_name:block'],
    ['First Name', 'person_name:block'],
    ['LastName', 'person_name:block'],
    ['MRN', 'record_number:block'],
    ['case number', 'record_number:block'],
    ['Home address', 'geography:block'],
    ['county', 'geography:block'],
    ['NHSNumber', 'national_id:block'],
    ['passport no', 'national_id:block'],
    ['Cell phone', 'phone:block'],
    ['fax', 'phone:block'],
    ['date of last visit', 'full_date:block'],
    ['injury_month', 'part_date:block'],
    ['ip', 'ip:block'],
    ['IBAN', 'account_or_plan:block'],
    ['Kennzeichen', 'licence_or_vehicle:block'],
    ['free text', 'free_text:warn'],
    ['entered_by', 'staff_name:warn'],
  ])('announces in "%s": %s', (header, expected) => {
    expect(written(header)).toEqual([expected]);
  });

  it.each(['ship_type', 'image_quality_score', 'session_minutes', 'months_since_injury', 'site_name', 'mobile_minutes', 'assn', 'message'])(
    'reads whole words only in "%s"',
    (header) => expect(written(header)).toEqual([]),
  );
});
