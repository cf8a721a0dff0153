/** Compiles the servers and bundles the client, each only when something it is made of has changed. */
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { z } from 'zod';
import { projectRoot } from '../project-root.ts';
import { runCommand } from './command.ts';
import { contentHash } from './content-hash.ts';
import { sweepOutputs } from './sweep-outputs.ts';

const Stamps = z.object({ servers: z.string(), client: z.string() }).partial();
type Stamps = z.infer<typeof Stamps>;
type Part = keyof Stamps;

/** In node_modules, because a stamp belongs to one checkout whatever its data folder, and dies with the packages. */
const stampFile = join(projectRoot, 'node_modules', '.cache', 'cairnstep', 'build.json');

const isLeftOut = (path: string): boolean =>
  ['node_modules', 'dist'].includes(basename(path)) || /\.(test|bench)\.tsx?$|\.tsbuildinfo$/.test(path);

const common = ['package-lock.json', 'infra/tooling/tsconfig.base.json', 'packages'];
const madeOf: Readonly<Record<Part, readonly string[]>> = {
  servers: [...common, 'tsconfig.json', 'services/api', 'services/fake-oidc', 'services/mail-catcher'],
  client: [...common, 'services/web'],
};

const readStamps = (): Stamps => (existsSync(stampFile) ? Stamps.parse(JSON.parse(readFileSync(stampFile, 'utf8'))) : {});

function writeStamp(part: Part, hash: string | undefined): void {
  mkdirSync(dirname(stampFile), { recursive: true });
  writeFileSync(stampFile, JSON.stringify({ ...readStamps(), [part]: hash }));
}

/** Folders of the projects that the compiler builds. */
function compiledProjects(): string[] {
  const { references } = JSON.parse(readFileSync(join(projectRoot, 'tsconfig.json'), 'utf8')) as { references: { path: string }[] };
  return references.map(({ path }) => join(projectRoot, path));
}

const isBuilt: Readonly<Record<Part, () => boolean>> = {
  servers: () => compiledProjects().every((project) => existsSync(join(project, 'dist'))),
  client: () => ['index.html', 'prepare.html'].every((page) => existsSync(join(projectRoot, 'services/web/dist', page))),
};

export interface BuildOptions {
  readonly logFile: string;
  /** Called when there is something to do. */
  readonly onWork: (what: string) => void;
  readonly signal?: AbortSignal;
}

async function compileServers({ logFile, signal }: BuildOptions): Promise<void> {
  for (const project of compiledProjects()) {
    sweepOutputs(project);
    // The compiler believes its notes; without the outputs they describe, they would keep it from writing them again.
    if (!existsSync(join(project, 'dist'))) {
      for (const name of readdirSync(project)) if (name.endsWith('.tsbuildinfo')) rmSync(join(project, name));
    }
  }
  await runCommand({
    title: 'Compiling the servers',
    program: process.execPath,
    arguments: [join(projectRoot, 'node_modules/typescript/bin/tsc'), '-b'],
    cwd: projectRoot,
    environment: process.env,
    logFile,
    ...(signal === undefined ? {} : { signal }),
  });
}

async function bundleClient({ logFile, signal }: BuildOptions): Promise<void> {
  await runCommand({
    title: 'Building the client',
    program: 'npm',
    arguments: ['run', 'build', '-w', 'services/web'],
    cwd: projectRoot,
    environment: process.env,
    logFile,
    ...(signal === undefined ? {} : { signal }),
  });
}

const steps: Readonly<Record<Part, { readonly what: string; readonly build: (options: BuildOptions) => Promise<void> }>> = {
  servers: { what: 'Compiling the servers', build: compileServers },
  client: { what: 'Building the client', build: bundleClient },
};

/** Brings the dist folders of the named parts up to date with their sources. */
export async function buildIfChanged(parts: readonly Part[], options: BuildOptions): Promise<void> {
  for (const part of parts) {
    const hash = contentHash(projectRoot, madeOf[part], isLeftOut);
    if (readStamps()[part] === hash && isBuilt[part]()) continue;
    options.onWork(steps[part].what);
    // A build that fails half-way must not count as the one before it.
    writeStamp(part, undefined);
    await steps[part].build(options);
    writeStamp(part, hash);
  }
}
