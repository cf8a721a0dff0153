/**
 * One application, two editions. Inside the registry's page it gives what was prepared to the page around it; as a file opened from disk
 * it has no page around it and saves what was prepared.
 */
export type Edition = 'embedded' | 'offline';

export const edition: Edition = window.parent === window ? 'offline' : 'embedded';
