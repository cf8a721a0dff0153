/** `fetch` cannot tell how much of a body has left; this can. For uploads. */

/**
 * `headers` as a plain record, `body` as bytes. `onSent` hears the part that has left, from 0 to 1. Rejects as `fetch` does: when
 * no answer comes, and when `signal` aborts.
 */
export function sendWithProgress(
  address: string,
  { method = 'GET', headers, body, signal }: RequestInit,
  onSent: (part: number) => void,
): Promise<Response> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    const stop = () => request.abort();
    request.open(method, address);
    for (const [name, value] of Object.entries(headers as Readonly<Record<string, string>>)) request.setRequestHeader(name, value);
    request.upload.addEventListener('progress', ({ lengthComputable, loaded, total }) => {
      if (lengthComputable && total > 0) onSent(loaded / total);
    });
    request.addEventListener('load', () => {
      const type = request.getResponseHeader('Content-Type') ?? '';
      resolve(new Response(request.responseText, { status: request.status, headers: { 'Content-Type': type } }));
    });
    request.addEventListener('error', () => reject(new TypeError('No answer came')));
    request.addEventListener('abort', () => reject(new DOMException('The sending was stopped', 'AbortError')));
    request.addEventListener('loadend', () => signal?.removeEventListener('abort', stop));
    if (signal?.aborted === true) return void reject(new DOMException('The sending was stopped', 'AbortError'));
    signal?.addEventListener('abort', stop);
    request.send((body ?? null) as XMLHttpRequestBodyInit | null);
  });
}
