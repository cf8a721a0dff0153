/** In the order they run. A test reads the folder and compares. */
import { FirstTables1796083200000 } from './1796083200000-first-tables.ts';
import { Reach1796083200001 } from './1796083200001-reach.ts';

export const migrations = [FirstTables1796083200000, Reach1796083200001];
