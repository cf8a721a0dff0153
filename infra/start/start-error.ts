/** Something the person who starts can mend; shown as its message alone, without a stack. */
export class StartError extends Error {}
