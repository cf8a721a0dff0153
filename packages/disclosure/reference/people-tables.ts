/**
 * Small tables of people from the literature with what is known about them. Class figures follow from the counts by arithmetic:
 * entropy l is e to the entropy, `recursiveC` the largest count over the sum of the others.
 */
import type { PersonRow } from '../src/index.ts';

export interface KnownPeople {
  readonly id: string;
  readonly source: string;
  readonly quasiIdentifiers: readonly string[];
  readonly sensitive: string;
  readonly rows: readonly PersonRow[];
  readonly k: number;
  readonly distinct: number;
  readonly entropyL: number;
  readonly highestRisk: number;
  readonly averageRisk: number;
  readonly classes: readonly {
    readonly values: readonly string[];
    readonly counts: readonly number[];
    readonly entropyL: number;
    readonly mostFrequentShare: number;
    readonly recursiveC: number;
  }[];
}

export const knownPeople: readonly KnownPeople[] = [
  {
    id: 'two-anonymous',
    source:
      'Sweeney L (2002), k-anonymity: a model for protecting privacy, Int J Uncertainty Fuzziness Knowl-Based Syst 10:557-570, example with k = 2 (values as remembered, not from a stored copy).',
    quasiIdentifiers: ['race', 'birth', 'gender', 'zip'],
    sensitive: 'problem',
    rows: [
      { race: 'Black', birth: '1965', gender: 'm', zip: '0214*', problem: 'short breath' },
      { race: 'Black', birth: '1965', gender: 'm', zip: '0214*', problem: 'chest pain' },
      { race: 'Black', birth: '1965', gender: 'f', zip: '0213*', problem: 'hypertension' },
      { race: 'Black', birth: '1965', gender: 'f', zip: '0213*', problem: 'hypertension' },
      { race: 'Black', birth: '1964', gender: 'f', zip: '0213*', problem: 'obesity' },
      { race: 'Black', birth: '1964', gender: 'f', zip: '0213*', problem: 'chest pain' },
      { race: 'White', birth: '1964', gender: 'm', zip: '0213*', problem: 'chest pain' },
      { race: 'White', birth: '1964', gender: 'm', zip: '0213*', problem: 'obesity' },
      { race: 'White', birth: '1964', gender: 'm', zip: '0213*', problem: 'short breath' },
      { race: 'White', birth: '1967', gender: 'm', zip: '0213*', problem: 'chest pain' },
      { race: 'White', birth: '1967', gender: 'm', zip: '0213*', problem: 'chest pain' },
    ],
    k: 2,
    distinct: 1,
    entropyL: 1.0,
    highestRisk: 0.5,
    averageRisk: 0.454545454545,
    classes: [
      { values: ['Black', '1965', 'm', '0214*'], counts: [1, 1], entropyL: 2.0, mostFrequentShare: 0.5, recursiveC: 1.0 },
      { values: ['Black', '1965', 'f', '0213*'], counts: [2], entropyL: 1.0, mostFrequentShare: 1.0, recursiveC: Number.POSITIVE_INFINITY },
      { values: ['Black', '1964', 'f', '0213*'], counts: [1, 1], entropyL: 2.0, mostFrequentShare: 0.5, recursiveC: 1.0 },
      { values: ['White', '1964', 'm', '0213*'], counts: [1, 1, 1], entropyL: 3.0, mostFrequentShare: 0.333333333333, recursiveC: 0.5 },
      { values: ['White', '1967', 'm', '0213*'], counts: [2], entropyL: 1.0, mostFrequentShare: 1.0, recursiveC: Number.POSITIVE_INFINITY },
    ],
  },
  {
    id: 'inpatients',
    source:
      'Machanavajjhala A, Kifer D, Gehrke J, Venkitasubramaniam M (2007), ACM Trans Knowl Discov Data 1(1):3, inpatient microdata (values as remembered, consistent with the published 3-diverse table).',
    quasiIdentifiers: ['zip', 'age', 'nationality'],
    sensitive: 'condition',
    rows: [
      { zip: '13053', age: 28, nationality: 'Russian', condition: 'heart disease' },
      { zip: '13068', age: 29, nationality: 'American', condition: 'heart disease' },
      { zip: '13068', age: 21, nationality: 'Japanese', condition: 'viral infection' },
      { zip: '13053', age: 23, nationality: 'American', condition: 'viral infection' },
      { zip: '14853', age: 50, nationality: 'Indian', condition: 'cancer' },
      { zip: '14853', age: 55, nationality: 'Russian', condition: 'heart disease' },
      { zip: '14850', age: 47, nationality: 'American', condition: 'viral infection' },
      { zip: '14850', age: 49, nationality: 'American', condition: 'viral infection' },
      { zip: '13053', age: 31, nationality: 'American', condition: 'cancer' },
      { zip: '13053', age: 37, nationality: 'Indian', condition: 'cancer' },
      { zip: '13068', age: 36, nationality: 'Japanese', condition: 'cancer' },
      { zip: '13068', age: 35, nationality: 'American', condition: 'cancer' },
    ],
    k: 1,
    distinct: 1,
    entropyL: 1.0,
    highestRisk: 1.0,
    averageRisk: 1.0,
    classes: [],
  },
  {
    id: 'inpatients-4-anonymous',
    source: 'The same, 4-anonymous table (values as remembered, consistent with the published 3-diverse table).',
    quasiIdentifiers: ['zip', 'age', 'nationality'],
    sensitive: 'condition',
    rows: [
      { zip: '130**', age: '<30', nationality: '*', condition: 'heart disease' },
      { zip: '130**', age: '<30', nationality: '*', condition: 'heart disease' },
      { zip: '130**', age: '<30', nationality: '*', condition: 'viral infection' },
      { zip: '130**', age: '<30', nationality: '*', condition: 'viral infection' },
      { zip: '1485*', age: '>=40', nationality: '*', condition: 'cancer' },
      { zip: '1485*', age: '>=40', nationality: '*', condition: 'heart disease' },
      { zip: '1485*', age: '>=40', nationality: '*', condition: 'viral infection' },
      { zip: '1485*', age: '>=40', nationality: '*', condition: 'viral infection' },
      { zip: '130**', age: '3*', nationality: '*', condition: 'cancer' },
      { zip: '130**', age: '3*', nationality: '*', condition: 'cancer' },
      { zip: '130**', age: '3*', nationality: '*', condition: 'cancer' },
      { zip: '130**', age: '3*', nationality: '*', condition: 'cancer' },
    ],
    k: 4,
    distinct: 1,
    entropyL: 1.0,
    highestRisk: 0.25,
    averageRisk: 0.25,
    classes: [
      { values: ['130**', '<30', '*'], counts: [2, 2], entropyL: 2.0, mostFrequentShare: 0.5, recursiveC: 1.0 },
      { values: ['1485*', '>=40', '*'], counts: [2, 1, 1], entropyL: 2.828427124746, mostFrequentShare: 0.5, recursiveC: 1.0 },
      { values: ['130**', '3*', '*'], counts: [4], entropyL: 1.0, mostFrequentShare: 1.0, recursiveC: Number.POSITIVE_INFINITY },
    ],
  },
  {
    id: 'inpatients-3-diverse',
    source: 'The same, 3-diverse table (row for row within each class as published).',
    quasiIdentifiers: ['zip', 'age', 'nationality'],
    sensitive: 'condition',
    rows: [
      { zip: '1305*', age: '<=40', nationality: '*', condition: 'heart disease' },
      { zip: '1306*', age: '<=40', nationality: '*', condition: 'heart disease' },
      { zip: '1306*', age: '<=40', nationality: '*', condition: 'viral infection' },
      { zip: '1305*', age: '<=40', nationality: '*', condition: 'viral infection' },
      { zip: '1485*', age: '>40', nationality: '*', condition: 'cancer' },
      { zip: '1485*', age: '>40', nationality: '*', condition: 'heart disease' },
      { zip: '1485*', age: '>40', nationality: '*', condition: 'viral infection' },
      { zip: '1485*', age: '>40', nationality: '*', condition: 'viral infection' },
      { zip: '1305*', age: '<=40', nationality: '*', condition: 'cancer' },
      { zip: '1305*', age: '<=40', nationality: '*', condition: 'cancer' },
      { zip: '1306*', age: '<=40', nationality: '*', condition: 'cancer' },
      { zip: '1306*', age: '<=40', nationality: '*', condition: 'cancer' },
    ],
    k: 4,
    distinct: 3,
    entropyL: 2.828427124746,
    highestRisk: 0.25,
    averageRisk: 0.25,
    classes: [
      { values: ['1305*', '<=40', '*'], counts: [2, 1, 1], entropyL: 2.828427124746, mostFrequentShare: 0.5, recursiveC: 1.0 },
      { values: ['1306*', '<=40', '*'], counts: [2, 1, 1], entropyL: 2.828427124746, mostFrequentShare: 0.5, recursiveC: 1.0 },
      { values: ['1485*', '>40', '*'], counts: [2, 1, 1], entropyL: 2.828427124746, mostFrequentShare: 0.5, recursiveC: 1.0 },
    ],
  },
];
