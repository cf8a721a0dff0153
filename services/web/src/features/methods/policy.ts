/**
 * Values the server works with, stated on these pages. The client cannot import the server, so they stand here a second time; a test
 * holds them to the server's own.
 */

/** Days before the first session within which an exam counts as the baseline exam. */
export const examWindowDays = 90;

/** Fewest people of an export who share level group, grade, age band and sex. */
export const smallestExportClass = 5;

/** Percent of people that may be left out of an export instead of coarsening it for all. */
export const largestPercentLeftOut = 5;

/** First years of the bands of age in an export after the youngest: ten-year bands, and three bands. */
export const tenYearEdges = [20, 30, 40, 50, 60, 70] as const;
export const threeBandEdges = [40, 60] as const;
