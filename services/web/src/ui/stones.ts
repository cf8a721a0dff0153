/** The five stones of the mark, lowest first, in a square of 32 by 32. */
export const stones = [
  { x: 2.5, y: 24.6, width: 27, height: 5.8, tilt: 0 },
  { x: 5, y: 18.7, width: 21.5, height: 5.2, tilt: -2.5 },
  { x: 8.5, y: 13.1, width: 17, height: 4.9, tilt: 3 },
  { x: 9.5, y: 7.9, width: 12, height: 4.5, tilt: -4 },
  { x: 13, y: 2.6, width: 8, height: 4.6, tilt: 5 },
] as const;
