/** A release never changes, so its facts are read once and kept. The newest few are kept whole; older ones are read again when asked for. */
const releasesKept = 3;

export class ReleaseCache<T> {
  private readonly kept = new Map<number, Map<string, Promise<T>>>();

  get(release: number, key: string, read: () => Promise<T>): Promise<T> {
    const ofRelease = this.kept.get(release) ?? new Map<string, Promise<T>>();
    // Moves the release to the end: the first in the map is the one not asked for longest.
    this.kept.delete(release);
    this.kept.set(release, ofRelease);
    const [oldest] = this.kept.keys();
    if (this.kept.size > releasesKept && oldest !== undefined) this.kept.delete(oldest);
    const found = ofRelease.get(key);
    if (found) return found;
    const reading = read();
    ofRelease.set(key, reading);
    reading.catch(() => ofRelease.delete(key));
    return reading;
  }
}
