/** npm run bench [name …]: runs the scenarios whose names contain one of the words, all by default. Exit code 1 when a goal is missed. */
import { projectRoot } from '../project-root.ts';
import { runSession } from '../start/session.ts';
import { StartError } from '../start/start-error.ts';
import { collectScenarios } from './collect.ts';
import { benchTable, missesGoal } from './table.ts';
import type { Row } from './table.ts';

await runSession(async ({ signal, report }) => {
  const words = process.argv.slice(2);
  const all = await collectScenarios(projectRoot);
  const chosen = words.length === 0 ? all : all.filter(({ name }) => words.some((word) => name.includes(word)));
  if (chosen.length === 0) throw new StartError(`No scenario has such a name. There are: ${all.map(({ name }) => name).join(', ')}.`);
  const rows: Row[] = [];
  for (const scenario of chosen) {
    signal.throwIfAborted();
    report(`${scenario.name} …`);
    rows.push({ name: scenario.name, ...(await scenario.run()) });
  }
  report(`\n${benchTable(rows)}`);
  return rows.some(missesGoal) ? 1 : 0;
}, 130);
