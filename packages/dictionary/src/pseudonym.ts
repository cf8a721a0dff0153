/**
 * Shape of a participant code: the letter S, 20 characters (100 bits) and a check character,
 * digits and capitals without I, L, O and U. Whether the check character is right is decided where codes are made.
 */
export const pseudonymAlphabet = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
export const pseudonymPattern = /^S[0-9A-HJKMNP-TV-Z]{21}$/;
