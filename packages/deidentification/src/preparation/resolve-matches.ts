import { tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';
import type { ColumnMatch } from './column-match.ts';
import { dayVariables } from './day-variables.ts';
import type { RawTable } from './month.ts';
import type { ProblemLog } from './problem-log.ts';

/** A match that names a column of the file and, where it has one, a variable of the dictionary. */
export interface ResolvedMatch {
  readonly match: ColumnMatch;
  readonly position: number;
  readonly variable: Variable | undefined;
}

/** Finds the columns that the matches speak of. What cannot be followed is reported and passed over. */
export function resolveMatches({ table, headers }: RawTable, matches: readonly ColumnMatch[], log: ProblemLog): ResolvedMatch[] {
  const taken = new Set<string>();
  return matches.flatMap((match): ResolvedMatch[] => {
    const position = headers.indexOf(match.header);
    if (position === -1) {
      log.add('no-such-column', { table }, 'A column that was matched is not in the file.');
      return [];
    }
    const place = { table, columnNumber: position + 1 };
    if (headers.lastIndexOf(match.header) !== position) {
      log.add('repeated-header', place, 'Two columns have this header. Rename one of them.');
      return [];
    }
    if (match.as === 'left-out') return [{ match, position, variable: undefined }];

    const variable = variableFor(table, match);
    if (variable === undefined && match.as !== 'participant' && match.as !== 'index-date') {
      log.add('no-such-variable', place, 'This table of the dictionary has nothing that such a column could fill.');
      return [];
    }
    const target = 'variable' in match ? match.variable : match.as;
    if (taken.has(target)) {
      log.add('column-matched-twice', place, 'Another column is matched to the same thing. Choose one of them.');
      return [];
    }
    taken.add(target);
    return [{ match, position, variable }];
  });
}

/** The variable that a match fills; of a date of injury the first of two. */
function variableFor(table: TableKey, match: ColumnMatch): Variable | undefined {
  const { variables } = tableOf(table);
  switch (match.as) {
    case 'value':
      return variables.find(({ key, type }) => key === match.variable && type !== 'pseudonym');
    case 'study-day':
      return dayVariables(table).find(({ key }) => key === match.variable);
    case 'birth-date':
      return variables.find(({ key }) => key === 'age_at_index');
    case 'injury-date':
      return variables.find(({ key }) => key === 'injury_year');
    default:
      return undefined;
  }
}
