/** Contrast of colours, and how they look to people who see fewer of them. */

export type Rgb = readonly [red: number, green: number, blue: number];

/** `#rrggbb` to linear light, 0 to 1 (WCAG 2.2, "relative luminance"). */
export function linear(hex: string): Rgb {
  const channel = (at: number) => {
    const value = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return [channel(1), channel(3), channel(5)];
}

export const luminance = ([red, green, blue]: Rgb): number => 0.2126 * red + 0.7152 * green + 0.0722 * blue;

/** 1 to 21 (WCAG 2.2, "contrast ratio"). */
export function contrast(a: Rgb, b: Rgb): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

/** Linear-light matrices for full dichromacy: Machado, Oliveira and Fernandes, IEEE TVCG 15(6), 2009, table 1. */
export const dichromacies: Readonly<Record<string, readonly [Rgb, Rgb, Rgb]>> = {
  protanopia: [
    [0.152286, 1.052583, -0.204868],
    [0.114503, 0.786281, 0.099216],
    [-0.003882, -0.048116, 1.051998],
  ],
  deuteranopia: [
    [0.367322, 0.860646, -0.227968],
    [0.280085, 0.672501, 0.047413],
    [-0.01182, 0.04294, 0.968881],
  ],
  tritanopia: [
    [1.255528, -0.076749, -0.178779],
    [-0.078411, 0.930809, 0.147602],
    [0.004733, 0.691367, 0.3039],
  ],
};

export function seenWith(matrix: readonly [Rgb, Rgb, Rgb], colour: Rgb): Rgb {
  const row = (weights: Rgb) => Math.min(1, Math.max(0, weights[0] * colour[0] + weights[1] * colour[1] + weights[2] * colour[2]));
  return [row(matrix[0]), row(matrix[1]), row(matrix[2])];
}
