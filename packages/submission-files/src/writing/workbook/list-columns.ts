/** The lists that the template's cells are chosen from, each a column of one sheet. Columns with the same codes share theirs. */
import { dictionary } from '@cairnstep/dictionary';
import type { Variable } from '@cairnstep/dictionary';
import { otherSheets } from '../../reading/workbook/sheet-names.ts';
import { columnLetters } from '../../table/header-row.ts';

interface ListColumn {
  readonly header: string;
  readonly values: readonly string[];
  /** Where the values stand, as a formula names it. */
  readonly range: string;
}

const codesOf = ({ codes = [], missingCodes = [] }: Variable): string[] => [...codes, ...missingCodes].map(({ code }) => code);

export class ListColumns {
  readonly columns: readonly ListColumn[];
  /** Number of the list by its codes. */
  private readonly byCodes = new Map<string, number>();
  private readonly hasParticipants: boolean;

  constructor(participants: readonly string[]) {
    const lists: { header: string; values: readonly string[]; others: number }[] = [
      { header: 'Participants', values: participants, others: 0 },
    ];
    this.hasParticipants = participants.length > 0;
    for (const table of dictionary.tables) {
      for (const variable of table.variables) {
        const values = codesOf(variable);
        const shared = lists[this.byCodes.get(values.join()) ?? -1];
        if (values.length === 0) continue;
        if (shared) shared.others += 1;
        else this.byCodes.set(values.join(), lists.push({ header: `${table.name}: ${variable.name}`, values, others: 0 }) - 1);
      }
    }
    this.columns = lists.map(({ header, values, others }, position) => ({
      header: others > 0 ? `${header}, and ${others} more` : header,
      values,
      range: `${otherSheets.lists}!$${columnLetters(position)}$2:$${columnLetters(position)}$${values.length + 1}`,
    }));
  }

  /** The list that a column's cells are chosen from; undefined when there is none. */
  listOf(variable: Variable): ListColumn | undefined {
    if (variable.type === 'pseudonym') return this.hasParticipants ? this.columns[0] : undefined;
    return this.columns[this.byCodes.get(codesOf(variable).join()) ?? -1];
  }
}
