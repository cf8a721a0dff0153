/**
 * Vectors of the pseudonym recipe, of study days and of the key file.
 *
 * Source: computed with Node 20's WebCrypto and, apart from it, with its `createHmac`, `pbkdf2Sync` and `createCipheriv` (OpenSSL 3). The
 * secrets and passphrases serve tests only. Study days are differences of calendar dates that can be counted by hand.
 */
import type { NormalisationOptions } from '../src/index.ts';

export interface PseudonymVector {
  readonly says: string;
  readonly secretHex: string;
  readonly site: string;
  readonly idType: string;
  readonly localId: string;
  readonly options: NormalisationOptions;
  readonly normalised: string;
  readonly code: string;
}

const counting = '000102030405060708090a0b0c0d0e0f101112131415161718191a1b1c1d1e1f';
const usual: NormalisationOptions = { stripSeparators: true, upper: true, stripLeadingZeros: false };
const withoutZeros: NormalisationOptions = { ...usual, stripLeadingZeros: true };

export const pseudonymVectors: readonly PseudonymVector[] = [
  {
    says: 'as it stands',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: '00482913',
    options: usual,
    normalised: '00482913',
    code: 'SSWDJQGNW1T2PF47GBENZQ',
  },
  {
    says: 'with blanks and a dash',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: ' 0048-2913 ',
    options: usual,
    normalised: '00482913',
    code: 'SSWDJQGNW1T2PF47GBENZQ',
  },
  {
    says: 'in full-width digits',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: '\uff10\uff10\uff14\uff18\uff12\uff19\uff11\uff13',
    options: usual,
    normalised: '00482913',
    code: 'SSWDJQGNW1T2PF47GBENZQ',
  },
  {
    says: 'without its leading zeros, which count',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: '482913',
    options: usual,
    normalised: '482913',
    code: 'SJ3G6AFENN47S21629XVNF',
  },
  {
    says: 'with leading zeros dropped',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: '00482913',
    options: withoutZeros,
    normalised: '482913',
    code: 'SJ3G6AFENN47S21629XVNF',
  },
  {
    says: 'without leading zeros, where they are dropped',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: '482913',
    options: withoutZeros,
    normalised: '482913',
    code: 'SJ3G6AFENN47S21629XVNF',
  },
  {
    says: 'at another site',
    secretHex: counting,
    site: 'site-08',
    idType: 'mrn',
    localId: '00482913',
    options: usual,
    normalised: '00482913',
    code: 'S3S1D6Y0PS1VCG1ND65GZM',
  },
  {
    says: 'as another kind of number',
    secretHex: counting,
    site: 'site-07',
    idType: 'study-id',
    localId: '00482913',
    options: usual,
    normalised: '00482913',
    code: 'SWNP142SKR1R541V5EFRM9',
  },
  {
    says: 'with a composed letter',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: 'a1-\u00e99',
    options: usual,
    normalised: 'A1\u00c99',
    code: 'S26EKGST1TE7ARZFT2GCB0',
  },
  {
    says: 'with a letter and its accent apart',
    secretHex: counting,
    site: 'site-07',
    idType: 'mrn',
    localId: 'a1-e\u03019',
    options: usual,
    normalised: 'A1\u00c99',
    code: 'S26EKGST1TE7ARZFT2GCB0',
  },
  {
    says: 'under another secret',
    secretHex: 'ffffffffffffffffffffffffffffffffffffffffffffffffffffffffffffffff',
    site: 'site-07',
    idType: 'mrn',
    localId: '00482913',
    options: usual,
    normalised: '00482913',
    code: 'S9EG3JX3A57GZEWR5ZWJKS',
  },
];

export const studyDayVectors = [
  { says: 'over a leap day', indexDate: '2024-02-28', date: '2024-03-01', studyDay: 2 },
  { says: 'where there is none', indexDate: '2023-02-28', date: '2023-03-01', studyDay: 1 },
  { says: 'over the change to summer time', indexDate: '2024-03-30', date: '2024-03-31', studyDay: 1 },
  { says: 'over the change back', indexDate: '2024-10-26', date: '2024-10-27', studyDay: 1 },
  { says: 'on the first training day', indexDate: '2024-03-05', date: '2024-03-05', studyDay: 0 },
  { says: 'before it', indexDate: '2024-03-05', date: '2024-03-02', studyDay: -3 },
  { says: 'over the turn of the year', indexDate: '2023-12-31', date: '2024-01-01', studyDay: 1 },
  { says: 'over five years', indexDate: '2019-06-14', date: '2024-06-14', studyDay: 1827 },
] as const;

export const keyFileVector = {
  passphrase: 'mural otter basin cloak fern ripple',
  header: {
    format: 'sci-gait-site-key',
    version: 1,
    site: 'site-07',
    keyId: '2026-01',
    kdf: { name: 'PBKDF2', hash: 'SHA-256', iterations: 600000, salt: 'ABEiM0RVZneImaq7zN3u/w==' },
    cipher: { name: 'AES-GCM', keyBits: 256, tagBits: 128, iv: 'Dw4NDAsKCQgHBgUE' },
  },
  additionalData:
    '{"cipher":{"iv":"Dw4NDAsKCQgHBgUE","keyBits":256,"name":"AES-GCM","tagBits":128},"format":"sci-gait-site-key","kdf":{"hash":"SHA-256","iterations":600000,"name":"PBKDF2","salt":"ABEiM0RVZneImaq7zN3u/w=="},"keyId":"2026-01","site":"site-07","version":1}',
  plaintext:
    '{"normalisation":{"stripLeadingZeros":false,"stripSeparators":true,"upper":true},"secret":"AAECAwQFBgcICQoLDA0ODxAREhMUFRYXGBkaGxwdHh8="}',
  ciphertext:
    'whiks0ezujDR0HObAOJYbDfwQxdvDUTN1IFn0L9vJ59fjdKosRzMfIv0gxINsifbHn4Cj9pCI2QHVJt5JZCnLnyJmWhwA+lxHSIGyIpN/yI1YfhVqc8oIR0CUD94glAHMLrl43EIj2/HP6lxQiYoUrKwpS/ObE9r9xJdIYawBAye7y089GG/FJGpctqqzdQxAFNh4u+8cOA8',
} as const;
