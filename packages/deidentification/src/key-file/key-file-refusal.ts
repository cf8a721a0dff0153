export type KeyFileRefusalCode =
  | 'not-a-key-file'
  | 'unknown-version'
  | 'too-few-iterations'
  | 'too-many-iterations'
  | 'other-site'
  /** Wrong passphrase, or a file that was altered: the cipher cannot tell which. */
  | 'cannot-be-opened'
  | 'older-file'
  | 'passphrase-too-short'
  | 'different-keys';

const messages: Readonly<Record<KeyFileRefusalCode, string>> = {
  'not-a-key-file': 'The file is not a key file of a site.',
  'unknown-version': 'The key file was written by a newer version of this page.',
  'too-few-iterations': 'The key file is protected too weakly to be used. Somebody may have altered it.',
  'too-many-iterations': 'Opening the key file would take unreasonably long. Somebody may have altered it.',
  'other-site': 'The key file belongs to another site.',
  'cannot-be-opened': 'The passphrase is wrong, or the file was altered.',
  'older-file': 'A newer copy of the key file was used before. Open that one, or people would get a second code.',
  'passphrase-too-short': 'The passphrase needs at least 15 characters.',
  'different-keys': 'The two key files do not come from the same key.',
};

/** Why a key file is not opened, saved or merged. The message may be shown as it is; it holds nothing from the file. */
export class KeyFileRefusal extends Error {
  constructor(readonly code: KeyFileRefusalCode) {
    super(messages[code]);
    this.name = 'KeyFileRefusal';
  }
}
