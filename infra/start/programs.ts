/** How Node runs a program of the services: as it was compiled, or from its TypeScript source. */
import { fileURLToPath } from 'node:url';

/** Node's arguments that make a child with an `ipc` channel end when its parent is gone, even by SIGKILL. */
export const leaveWithParent = ['--import', fileURLToPath(new URL('./leave-with-parent.mjs', import.meta.url))] as const;

/** Node's arguments for the program with this source, relative to the project's root. */
type Programs = (source: string) => readonly string[];

export const compiled: Programs = (source) => ['--enable-source-maps', source.replace('/src/', '/dist/').replace(/\.ts$/, '.js')];

const tsx = 'node_modules/tsx/dist/cli.mjs';
/** The tsconfig says how decorators are compiled; without it entities come out wrong. */
const likeTheBuild = ['--tsconfig', 'services/api/tsconfig.json', '--conditions=@cairnstep/source'];

export const fromSource: Programs = (source) => [tsx, ...likeTheBuild, source];

/** As `fromSource`, started again when a file changes. */
export const watched: Programs = (source) => [tsx, 'watch', '--clear-screen=false', ...likeTheBuild, source];
