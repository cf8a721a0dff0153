/**
 * What a reader can work out from several tables of the same people at once: slices and the table of all, a table and a coarser
 * version of it, this release and the one before.
 *
 * People are split into atoms, the finest groups of which every printed figure is a sum. For each hidden figure the smallest and
 * largest value is a linear programme over the atoms; where its solution is not in whole people it is solved again over whole
 * numbers, so the bounds are exact. For one two-way table `intervalAudit` gives the same without a solver.
 *
 * Source: house rule "linked tables: linear programme"; solver HiGHS (MIT licence), compiled to WebAssembly by the package `highs`.
 */
import type { Highs, Model } from 'highs';
import type { Knowledge } from './interval-audit.ts';
import { notZero } from './interval-audit.ts';

/** A figure that is printed somewhere, or stands there hidden. `label` is the caller's name for it. */
export interface LinkedFigure<Label> {
  readonly label: Label;
  /** Positions in `LinkedTables.atoms`, each at most once. */
  readonly atoms: readonly number[];
  readonly hidden: boolean;
}

export interface LinkedTables<Label> {
  /** People per atom. Everybody is in exactly one atom. */
  readonly atoms: readonly number[];
  readonly figures: readonly LinkedFigure<Label>[];
}

export interface LinkedInterval<Label> {
  readonly label: Label;
  readonly low: number;
  /** `Infinity` when nothing printed bounds the figure. */
  readonly high: number;
}

export interface LinkedAuditOptions<Label> {
  /** What the reader knows about each hidden figure; without it, that it is not zero. The true value must lie within. */
  readonly knowledge?: (label: Label) => Knowledge;
}

export type LinearSolver = Highs;

/** Loads the solver (a few tens of milliseconds). Keep the result: solving is synchronous from then on. */
export async function loadLinearSolver(): Promise<LinearSolver> {
  const module = await import('highs');
  // The package's types describe its CommonJS build; the ES module that is really loaded exports the loader itself.
  const load = module.default as unknown as () => Promise<Highs>;
  return load();
}

/**
 * Exact intervals of all hidden figures, in the order given.
 *
 * @throws RangeError for malformed input, or a true value outside the stated knowledge.
 */
export function linkedIntervalAudit<Label>(
  solver: LinearSolver,
  tables: LinkedTables<Label>,
  options: LinkedAuditOptions<Label> = {},
): LinkedInterval<Label>[] {
  const values = tables.figures.map((figure) => valueOf(tables.atoms, figure.atoms));
  const limits = tables.figures.map((figure, at) => {
    const value = values[at] ?? 0;
    if (!figure.hidden) return { least: value, most: value };
    const known = options.knowledge?.(figure.label) ?? notZero;
    if (value < known.least || value > known.most) throw new RangeError('A hidden figure lies outside what the reader is said to know.');
    return known;
  });
  return solver.withModel(programme(tables, limits), (model) => {
    model.options.set({ output_flag: false, presolve: 'off', mip_rel_gap: 0 });
    return tables.figures.flatMap(({ label, atoms, hidden }) =>
      hidden ? [{ label, low: smallest(solver, model, atoms, 1), high: 0 - smallest(solver, model, atoms, -1) }] : [],
    );
  });
}

function valueOf(atoms: readonly number[], members: readonly number[]): number {
  if (new Set(members).size !== members.length) throw new RangeError('A figure names an atom twice.');
  return members.reduce((sum, member) => {
    const people = atoms[member];
    if (people === undefined) throw new RangeError('A figure names an atom that does not exist.');
    if (!Number.isSafeInteger(people) || people < 0) throw new RangeError('Counts of people are whole numbers from 0.');
    return sum + people;
  }, 0);
}

/** One column per atom, one row per figure: what it adds up to, or between which limits. */
function programme<Label>(tables: LinkedTables<Label>, limits: readonly Knowledge[]) {
  const starts = [0];
  const indices: number[] = [];
  for (const { atoms } of tables.figures) {
    indices.push(...atoms);
    starts.push(indices.length);
  }
  const numCols = tables.atoms.length;
  const numRows = tables.figures.length;
  return {
    numCols,
    numRows,
    colCost: new Float64Array(numCols),
    colLower: new Float64Array(numCols),
    colUpper: new Float64Array(numCols).fill(Number.POSITIVE_INFINITY),
    rowLower: limits.map(({ least }) => least),
    rowUpper: limits.map(({ most }) => most),
    matrix: { format: 'csr' as const, numRows, numCols, starts, indices, values: indices.map(() => 1) },
  };
}

/** How far a value may be from a whole number and still be one: the solver's own feasibility tolerance, with room. */
const WHOLE = 1e-5;
const isWhole = (value: number) => Math.abs(value - Math.round(value)) < WHOLE;

/** Smallest value of `sign` times the sum of these atoms, in whole people. */
function smallest(solver: LinearSolver, model: Model, atoms: readonly number[], sign: 1 | -1): number {
  for (const atom of atoms) model.changeColCost(atom, sign);
  const bound = solve(solver, model);
  for (const atom of atoms) model.changeColCost(atom, 0);
  return bound;
}

function solve(solver: LinearSolver, model: Model): number {
  const { modelStatus } = solver.constants;
  const status = model.run().modelStatus;
  // The true table satisfies every row, so "unbounded or infeasible" can only mean unbounded.
  if (status === modelStatus.unbounded || status === modelStatus.unboundedOrInfeasible) return Number.NEGATIVE_INFINITY;
  if (status !== modelStatus.optimal) throw new Error(`The linear programme ended with status ${String(status)}.`);
  if (!model.getSolution().colValue.every(isWhole)) return solveInWholePeople(solver, model);
  return wholePeople(model);
}

function solveInWholePeople(solver: LinearSolver, model: Model): number {
  const { modelStatus, variableType } = solver.constants;
  const { numCols } = model.getDimensions();
  const all = { kind: 'range', from: 0, to: numCols - 1 } as const;
  model.changeColsIntegrality(all, new Int32Array(numCols).fill(variableType.integer));
  try {
    if (model.run().modelStatus !== modelStatus.optimal) throw new Error('The programme over whole people did not end with an optimum.');
    return wholePeople(model);
  } finally {
    model.clearIntegrality();
  }
}

/** The objective as a whole number; a tiny negative one becomes a plain zero. */
function wholePeople(model: Model): number {
  return Math.round(model.getObjectiveValue()) + 0;
}
