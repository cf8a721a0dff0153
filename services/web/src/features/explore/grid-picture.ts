/** The grid as a picture of its own (SVG), for a slide or a paper: with its source, its method and what the marks mean. */
import type { Cell, Grid } from '@cairnstep/contract';
import { formatDate, formatNumber } from '../../lib/format.ts';
import { intervalText, meanText, sourceOf, statisticNames, unitText } from './grid-words.ts';
import { intervalScale, positionOn } from './interval-scale.ts';
import type { IntervalScale } from './interval-scale.ts';

/** The light theme's colours: a picture has no theme to follow. */
const ink = '#23272b';
const quiet = '#59626a';
const edge = '#857f72';
const hairline = '#d9d3c4';
const ramp = { A: '#e3ead8', B: '#bfd0ac', C: '#93ae7d', D: '#6a8a58', E: '#415c34', ND: '#fcfbf7' } as const;

const margin = 24;
const labelWidth = 160;
const cellWidth = 132;
const rowHeight = 72;
const headTop = 104;
const headHeight = 56;
const footLine = 20;

const escaped = (text: string): string =>
  text.replace(/[&<>"]/g, (sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[sign] ?? '');

const text = (x: number, y: number, words: string, look = ''): string =>
  `<text x="${x}" y="${y}"${look === '' ? '' : ` ${look}`}>${escaped(words)}</text>`;

export function gridPicture(grid: Grid): string {
  const scale = intervalScale(grid);
  const columns = [...grid.grades, 'all'] as const;
  const rows = [
    ...grid.rows.map(({ label, cells, total }) => ({ label, cells: [...cells, total] })),
    { label: 'All levels', cells: [...grid.columnTotals, grid.total] },
  ];
  const width = margin * 2 + labelWidth + columns.length * cellWidth;
  const left = (column: number) => margin + labelWidth + column * cellWidth;
  const top = (row: number) => headTop + headHeight + row * rowHeight;
  const unit = unitText(grid.outcome);
  const title = `${statisticNames[grid.statistic]}: ${grid.outcome.name}${unit === '' ? '' : `, ${unit}`}`;
  const feet = [
    grid.method,
    ...grid.notes,
    'ND: grade not determinable. Three strokes: not shown (fewer than 11, or protecting such a count). Group statistics do not choose treatment for one person.',
  ];
  const height = top(rows.length) + margin + feet.length * footLine;

  const heads = columns.map((grade, column) =>
    grade === 'all'
      ? text(left(column) + 8, headTop + 44, 'All grades', 'font-weight="600"')
      : `<rect x="${left(column) + 8}" y="${headTop + 8}" width="${cellWidth - 16}" height="8" fill="${ramp[grade]}" stroke="${edge}"/>` +
        text(left(column) + 8, headTop + 44, grade === 'ND' ? 'ND' : `AIS ${grade}`, 'font-weight="600"'),
  );
  const body = rows.flatMap(({ label, cells }, row) => [
    `<line x1="${margin}" x2="${width - margin}" y1="${top(row)}" y2="${top(row)}" stroke="${row === 0 ? edge : hairline}"/>`,
    text(margin, top(row) + 24, label, 'font-weight="600"'),
    ...cells.map((cell, column) => cellPicture(cell, grid, scale, left(column) + 8, top(row), columns[column] ?? 'all')),
  ]);
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}" role="img" font-family="'Public Sans', sans-serif" font-size="14" fill="${ink}">`,
    `<title>${escaped(title)}</title>`,
    `<rect width="${width}" height="${height}" fill="#fcfbf7"/>`,
    text(margin, 44, title, 'font-size="20" font-weight="600"'),
    text(margin, 72, subtitleOf(grid, scale), `fill="${quiet}"`),
    ...heads,
    ...body,
    `<line x1="${margin}" x2="${width - margin}" y1="${top(rows.length)}" y2="${top(rows.length)}" stroke="${edge}"/>`,
    ...feet.map((words, index) => text(margin, top(rows.length) + margin + index * footLine, words, `font-size="12" fill="${quiet}"`)),
    '</svg>\n',
  ].join('\n');
}

function subtitleOf(grid: Grid, scale: IntervalScale | null): string {
  const source = grid.release === null ? sourceOf(grid) : `Release ${grid.release.number}, ${formatDate(grid.release.madeAt)}`;
  const line =
    scale?.reference === undefined ? '' : grid.statistic === 'change' ? ' Dashed line: no change.' : ' Dashed line: mean of everyone.';
  return `${source}. Mean, 95% interval, n.${line}`;
}

function cellPicture(cell: Cell, grid: Grid, scale: IntervalScale | null, x: number, y: number, grade: keyof typeof ramp | 'all'): string {
  if (cell.state === 'empty') return text(x, y + 24, 'none', `fill="${quiet}"`);
  if (cell.state === 'hidden')
    return `<path d="M${x + 1} ${y + 25} l7 -10 m-3 10 l7 -10 m-3 10 l6 -8.5" stroke="${edge}" stroke-width="1.5" fill="none"/>`;
  return [
    text(x, y + 24, meanText(cell, grid), 'font-weight="600"'),
    text(x + cellWidth - 20, y + 24, `n ${formatNumber(cell.n)}`, `text-anchor="end" font-size="12" fill="${quiet}"`),
    scale === null ? '' : markPicture(cell, scale, x, y + 38, grade),
    text(x, y + 60, intervalText(cell, grid), `font-size="12" fill="${quiet}"`),
  ].join('');
}

function markPicture(
  cell: Extract<Cell, { state: 'shown' }>,
  scale: IntervalScale,
  x: number,
  y: number,
  grade: keyof typeof ramp | 'all',
): string {
  const at = (value: number) => Math.round((x + positionOn(scale, value) * (cellWidth - 24)) * 10) / 10;
  const { mean, interval } = cell;
  const isCut = (value: number) => value < scale.lower || value > scale.upper;
  const end = (value: number, outward: 1 | -1) =>
    isCut(value)
      ? `<path d="M${at(value) - 5 * outward} ${y - 4} L${at(value)} ${y} l${-5 * outward} 4" stroke="${quiet}" fill="none"/>`
      : `<line x1="${at(value)}" x2="${at(value)}" y1="${y - 4}" y2="${y + 4}" stroke="${quiet}"/>`;
  return [
    scale.reference === undefined
      ? ''
      : `<line x1="${at(scale.reference)}" x2="${at(scale.reference)}" y1="${y - 7}" y2="${y + 7}" stroke="${edge}" stroke-dasharray="2 2"/>`,
    interval === null
      ? ''
      : `<line x1="${at(interval.lower)}" x2="${at(interval.upper)}" y1="${y}" y2="${y}" stroke="${quiet}" stroke-width="3"/>${end(interval.lower, -1)}${end(interval.upper, 1)}`,
    `<circle cx="${at(mean)}" cy="${y}" r="4.5" fill="${grade === 'all' ? '#fcfbf7' : ramp[grade]}" stroke="${ink}" stroke-width="1.5"/>`,
  ].join('');
}
