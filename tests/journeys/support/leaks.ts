/** Whether bytes hold any of the values that must stay at the clinic: as they are, or in one of the disguises that programs give to text. */

/** Base64 of a text at each of the three places it can have in a longer one: the characters that do not depend on its neighbours. */
function base64Forms(text: string): string[] {
  const bytes = Buffer.from(text);
  return [0, 1, 2].map((shift) => {
    const padded = Buffer.concat([Buffer.alloc(shift), bytes]);
    const begin = Math.ceil((shift * 8) / 6);
    const end = Math.floor((padded.length * 8) / 6);
    return padded.toString('base64').slice(begin, end);
  });
}

const reversed = (text: string): string => [...text].reverse().join('');

function disguises(value: string): Buffer[] {
  const bytes = Buffer.from(value);
  const texts = [
    value,
    encodeURIComponent(value),
    encodeURIComponent(value).replaceAll('%20', '+'),
    JSON.stringify(value).slice(1, -1),
    reversed(value),
    bytes.toString('hex'),
    bytes.toString('hex').toUpperCase(),
    ...base64Forms(value),
    ...base64Forms(value).map((text) => text.replaceAll('+', '-').replaceAll('/', '_')),
  ];
  return [...[...new Set(texts)].map((text) => Buffer.from(text)), Buffer.from(value, 'utf16le')];
}

/** What stands between two fields of a form, an address, a JSON text or a table. */
const betweenFields = new Set(Buffer.from(' \t\r\n,;:&="\'{}[]|'));
const joined = (bytes: Buffer): Buffer => bytes.filter((byte) => !betweenFields.has(byte)) as Buffer;

interface Form {
  readonly value: string;
  readonly bytes: Buffer;
}

/** All values that have a form in the bytes. One pass, whatever the number of forms: they are found by their first four bytes. */
function found(bytes: Buffer, forms: readonly Form[]): Set<string> {
  const byBeginning = new Map<number, Form[]>();
  const mayBegin = new Uint8Array(0x10000);
  for (const form of forms) {
    const beginning = form.bytes.readUInt32LE(0);
    mayBegin[beginning & 0xffff] = 1;
    byBeginning.set(beginning, [...(byBeginning.get(beginning) ?? []), form]);
  }
  const values = new Set<string>();
  for (let at = 0; at + 4 <= bytes.length; at += 1) {
    if (mayBegin[(bytes[at] ?? 0) | ((bytes[at + 1] ?? 0) << 8)] === 0) continue;
    for (const form of byBeginning.get(bytes.readUInt32LE(at)) ?? [])
      if (bytes.subarray(at, at + form.bytes.length).equals(form.bytes)) values.add(form.value);
  }
  return values;
}

/**
 * The planted values that are in the bytes; each is told once, however often it is there.
 * @param planted Of four characters at least.
 */
export function leaksIn(bytes: Buffer, planted: readonly string[]): string[] {
  const disguised = planted.flatMap((value) => disguises(value).map((form): Form => ({ value, bytes: form })));
  const split = planted.flatMap((value) => [value, reversed(value)].map((form): Form => ({ value, bytes: joined(Buffer.from(form)) })));
  const values = new Set([...found(bytes, disguised), ...found(joined(bytes), split)]);
  return planted.filter((value) => values.has(value));
}
