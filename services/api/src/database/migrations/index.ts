/** In the order they run. A test reads the folder and compares. */
import { FirstTables1796083200000 } from './1796083200000-first-tables.ts';
import { Reach1796083200001 } from './1796083200001-reach.ts';
import { ScreenedFiles1796083200010 } from './1796083200010-screened-files.ts';
import { MonthClosures1796083200020 } from './1796083200020-month-closures.ts';
import { SiteSystems1796083200021 } from './1796083200021-site-systems.ts';
import { ReplacedCodes1796083200022 } from './1796083200022-replaced-codes.ts';
import { CoordinatorAddresses1796083200023 } from './1796083200023-coordinator-addresses.ts';
import { QuickerMonths1796083200030 } from './1796083200030-quicker-months.ts';
import { DeletedDrafts1796083200031 } from './1796083200031-deleted-drafts.ts';

export const migrations = [
  FirstTables1796083200000,
  Reach1796083200001,
  ScreenedFiles1796083200010,
  MonthClosures1796083200020,
  SiteSystems1796083200021,
  ReplacedCodes1796083200022,
  CoordinatorAddresses1796083200023,
  QuickerMonths1796083200030,
  DeletedDrafts1796083200031,
];
