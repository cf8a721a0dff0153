/** JSON with sorted keys and no spaces: one text for one value (in the manner of RFC 8785; integers and strings only, so numbers need no rule). */
export type Canonical = string | number | boolean | null | readonly Canonical[] | { readonly [key: string]: Canonical };

export function canonicalJson(value: Canonical): string {
  if (typeof value === 'number' && !Number.isSafeInteger(value)) throw new TypeError('Only integers have one canonical form here.');
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  const object = value as { readonly [key: string]: Canonical };
  const keys = Object.keys(object).sort((a, b) => compareByCodePoint(a, b));
  return `{${keys.map((key) => `${JSON.stringify(key)}:${canonicalJson(object[key] as Canonical)}`).join(',')}}`;
}

function compareByCodePoint(a: string, b: string): number {
  const left = [...a];
  const right = [...b];
  for (let i = 0; i < Math.min(left.length, right.length); i += 1) {
    const difference = (left[i]?.codePointAt(0) ?? 0) - (right[i]?.codePointAt(0) ?? 0);
    if (difference !== 0) return difference;
  }
  return left.length - right.length;
}
