/**
 * Shape of a participant code: the letter S, 20 characters (100 bits) and a check character,
 * digits and capitals without I, L, O and U.
 */
export const pseudonymAlphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
export const pseudonymPattern = /^S[0-9A-HJKMNP-TV-Z]{21}$/;

/** The check character of a code: of its first byte. @param digest SHA-256 of all that stands before it, computed where codes are made */
export const checkCharacterOf = ([first = 0]: Uint8Array): string => pseudonymAlphabet.charAt(first & 31);
