/** Uploads as component tests need them: an XMLHttpRequest that asks whatever stands in for `fetch`. Never part of the built client. */
import { afterEach, vi } from 'vitest';

afterEach(() => vi.unstubAllGlobals());

/** Call after `fakeApi`. Every file leaves in two halves. */
export function fakeUpload(): void {
  vi.stubGlobal('XMLHttpRequest', FakeRequest);
}

class FakeRequest extends EventTarget {
  readonly upload = new EventTarget();
  status = 0;
  responseText = '';
  private type: string | null = null;
  private method = 'GET';
  private address = '';
  private readonly headers: Record<string, string> = {};
  private stopped = false;

  open(method: string, address: string): void {
    this.method = method;
    this.address = address;
  }

  setRequestHeader(name: string, value: string): void {
    this.headers[name] = value;
  }

  getResponseHeader(): string | null {
    return this.type;
  }

  abort(): void {
    this.stopped = true;
    this.end('abort');
  }

  send(body: BodyInit | null): void {
    for (const loaded of [1, 2]) this.upload.dispatchEvent(new ProgressEvent('progress', { lengthComputable: true, loaded, total: 2 }));
    void fetch(this.address, { method: this.method, headers: this.headers, body }).then(
      async (response) => {
        this.responseText = await response.text();
        this.status = response.status;
        this.type = response.headers.get('Content-Type');
        if (!this.stopped) this.end('load');
      },
      () => this.end('error'),
    );
  }

  private end(how: 'load' | 'error' | 'abort'): void {
    this.dispatchEvent(new ProgressEvent(how));
    this.dispatchEvent(new ProgressEvent('loadend'));
  }
}
