/** In the order they run. A test reads the folder and compares. */
import { FirstTables1796083200000 } from './1796083200000-first-tables.ts';
import { Reach1796083200001 } from './1796083200001-reach.ts';
import { MonthClosures1796083200020 } from './1796083200020-month-closures.ts';
import { QuickerMonths1796083200030 } from './1796083200030-quicker-months.ts';

export const migrations = [FirstTables1796083200000, Reach1796083200001, MonthClosures1796083200020, QuickerMonths1796083200030];
