const bareNumber = /^[+-]?\d{1,30}(?:[.,]\d{1,15})?$/;

/** Whether a normalised cell is one number and nothing else. */
export const isBareNumber = (text: string): boolean => bareNumber.test(text);
