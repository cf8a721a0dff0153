/** The few looks that cells of our workbooks have (ECMA-376-1, 18.8). */

/** Cells of this number format hold what is typed as text, so that no code becomes a date or loses a zero (18.8.30). */
const textFormat = 49;

interface Look {
  readonly font?: string;
  readonly fill?: string;
  readonly isText?: boolean;
  readonly wraps?: boolean;
}

const bold = '<b/>';
const muted = '<i/><color rgb="FF5A6570"/>';
const pale = 'FFEEF1F4';

const looks = {
  plain: {},
  text: { isText: true },
  wrapped: { wraps: true },
  title: { font: `${bold}<sz val="14"/>` },
  header: { font: bold, fill: 'FFD9E2EC', isText: true, wraps: true },
  requiredHeader: { font: bold, fill: 'FFB3C5D7', isText: true, wraps: true },
  example: { font: muted, fill: pale },
  exampleText: { font: muted, fill: pale, isText: true },
  error: { fill: 'FFF8CFC9' },
  errorText: { fill: 'FFF8CFC9', isText: true },
  warning: { fill: 'FFFBE6B0' },
  warningText: { fill: 'FFFBE6B0', isText: true },
  link: { font: '<u/><color rgb="FF1F5F99"/>' },
} as const satisfies Readonly<Record<string, Look>>;

export type CellStyle = keyof typeof looks;

const names = Object.keys(looks) as CellStyle[];
const all: readonly Look[] = Object.values(looks);

/** The style's number, as cells refer to it. */
const numbers: Readonly<Record<CellStyle, number>> = Object.fromEntries(names.map((name, index) => [name, index])) as Record<
  CellStyle,
  number
>;

export const styleNumber = (style: CellStyle): number => numbers[style];

const fonts = [...new Set(all.map(({ font = '' }) => font))];
const fills = [...new Set(all.flatMap(({ fill }) => (fill === undefined ? [] : [fill])))];
/** Programs take the first two fills for theirs. */
const ownFills = 2;

function styleXml({ font = '', fill, isText, wraps }: Look): string {
  const fillNumber = fill === undefined ? 0 : fills.indexOf(fill) + ownFills;
  const format = isText ? textFormat : 0;
  const attributes = `numFmtId="${format}" fontId="${fonts.indexOf(font)}" fillId="${fillNumber}" borderId="0" xfId="0" applyNumberFormat="1" applyFont="1" applyFill="1"`;
  return wraps ? `<xf ${attributes} applyAlignment="1"><alignment vertical="top" wrapText="1"/></xf>` : `<xf ${attributes}/>`;
}

/** The part that describes the styles. */
export function stylesXml(): string {
  const fontXml = fonts.map((font) => `<font>${font}${font.includes('<sz') ? '' : '<sz val="11"/>'}<name val="Calibri"/></font>`);
  const fillXml = fills.map(
    (colour) => `<fill><patternFill patternType="solid"><fgColor rgb="${colour}"/><bgColor indexed="64"/></patternFill></fill>`,
  );
  return `<styleSheet xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><fonts count="${fonts.length}">${fontXml.join('')}</fonts><fills count="${fills.length + ownFills}"><fill><patternFill patternType="none"/></fill><fill><patternFill patternType="gray125"/></fill>${fillXml.join('')}</fills><borders count="1"><border><left/><right/><top/><bottom/><diagonal/></border></borders><cellStyleXfs count="1"><xf numFmtId="0" fontId="0" fillId="0" borderId="0"/></cellStyleXfs><cellXfs count="${all.length}">${all.map(styleXml).join('')}</cellXfs><cellStyles count="1"><cellStyle name="Normal" xfId="0" builtinId="0"/></cellStyles></styleSheet>`;
}
