/** Mean length of a year in the Julian calendar, for comparing ages in years with study days. */
export const daysInAYear = 365.25;
