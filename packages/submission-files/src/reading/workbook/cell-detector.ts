import type { PartHandler } from './scan-part.ts';

/** Finds out whether a sheet has a cell that is not empty, and looks no further. */
export class CellDetector implements PartHandler {
  isDone = false;
  private inCell = false;

  open(name: string, _: unknown, depth: number): void {
    if (depth === 4) this.inCell = name === 'c';
  }

  text(text: string): void {
    if (this.inCell && /\S/.test(text)) this.isDone = true;
  }

  close(_: string, depth: number): void {
    if (depth === 4) this.inCell = false;
  }
}
