function decodedOrNull(text: string): string | null {
  try {
    return decodeURIComponent(text);
  } catch {
    return null;
  }
}

/** Where to land after signing in: a path of this application, or home. */
export function safeReturnTo(wanted: unknown): string {
  if (typeof wanted !== 'string' || wanted.length > 500) return '/';
  // A browser reads `//x`, `/\x` and control characters as another host or scheme; percent-decoding must not bring them in either.
  const decoded = decodedOrNull(wanted);
  if (decoded === null) return '/';
  const looksLocal = (text: string) => /^\/(?![/\\])[^\\\s\p{Cc}]*$/u.test(text);
  if (!looksLocal(wanted) || !looksLocal(decoded) || decoded.startsWith('/api/')) return '/';
  const base = 'http://here.invalid';
  return new URL(wanted, base).origin === base ? wanted : '/';
}
