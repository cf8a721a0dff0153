/** Both spellings of true that XML Schema allows; an attribute that is not there is not true. */
export const isTrue = (value: string | null): boolean => value === '1' || value === 'true';
