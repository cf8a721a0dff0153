/** What a benchmark scenario is: our measure of something beside a named peer's measure of the same. */
export interface Measured {
  /** Our figure, in `unit`; less is better. */
  readonly ours: number;
  /** The peer's, in the same unit. */
  readonly peer: number;
  /** "s", "ms", "MB". */
  readonly unit: string;
  /** What the peer is, with its version where it has one. */
  readonly peerName: string;
  /** What ours should not exceed, in the same unit. */
  readonly goal?: number;
  /** What else was seen, printed below the table. */
  readonly note?: string;
}

export interface Scenario {
  readonly name: string;
  run(): Promise<Measured>;
}
