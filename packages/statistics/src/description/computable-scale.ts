/**
 * Values so large or so small that their squares leave the range of a double are computed with on another scale: divided by a power
 * of two, which loses no digit. Ordinary data pass through untouched.
 */

/** Values above this are refused, so that no interval around them overflows. */
const largest = 1e300;

export interface Scaled {
  readonly samples: readonly Float64Array[];
  /** Multiply a result in the unit of the data by this. */
  readonly factor: number;
}

export function computableScale(samples: readonly Float64Array[]): Scaled | 'too large' {
  let greatest = 0;
  for (const sample of samples) {
    for (let i = 0; i < sample.length; i++) {
      const size = Math.abs(sample[i] as number);
      if (size > greatest) greatest = size;
    }
  }
  if (greatest > largest) return 'too large';
  if (greatest === 0 || (greatest < 1e50 && greatest > 1e-50)) return { samples, factor: 1 };
  // At most 2^1022, so that the reciprocal is a normal number; a subnormal datum is then still far from underflow when squared.
  const factor = 2 ** Math.max(-1022, Math.floor(Math.log2(greatest)));
  return { samples: samples.map((sample) => sample.map((value) => value / factor)), factor };
}
