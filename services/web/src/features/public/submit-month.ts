/** The example as it is shown is the file that is run in the tests. */
import source from './submit-month.sh?raw';

export const submitMonthScript: string = source;
