/** The notes of a sheet: their texts (ECMA-376-1, 18.7) and the shapes that programs draw them as (ECMA-376-4, 19.4). */
import { columnLetters } from '../../table/header-row.ts';
import { escapeXml } from './escape-xml.ts';
import type { PlannedNote } from './sheet-plan.ts';

export function* notesXml(notes: readonly PlannedNote[]): Generator<string> {
  yield '<comments xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><authors><author>Registry</author></authors><commentList>';
  for (const { line, column, text } of notes)
    yield `<comment ref="${columnLetters(column)}${line}" authorId="0"><text><t xml:space="preserve">${escapeXml(text)}</t></text></comment>`;
  yield '</commentList></comments>';
}

/** Shapes are numbered from here on. */
const firstShape = 1_025;

export function* noteShapesXml(notes: readonly PlannedNote[]): Generator<string> {
  yield '<xml xmlns:v="urn:schemas-microsoft-com:vml" xmlns:o="urn:schemas-microsoft-com:office:office" xmlns:x="urn:schemas-microsoft-com:office:excel">';
  yield '<v:shapetype id="_x0000_t202" coordsize="21600,21600" o:spt="202" path="m,l,21600r21600,l21600,xe"><v:stroke joinstyle="miter"/><v:path gradientshapeok="t" o:connecttype="rect"/></v:shapetype>';
  for (const [index, { line, column }] of notes.entries()) {
    const anchor = [column + 1, 15, line, 10, column + 4, 15, line + 6, 4].join(', ');
    yield `<v:shape id="_x0000_s${firstShape + index}" type="#_x0000_t202" style="position:absolute;visibility:hidden" fillcolor="#ffffe1" o:insetmode="auto"><v:fill color2="#ffffe1"/><v:shadow on="t" color="black" obscured="t"/><v:path o:connecttype="none"/><v:textbox/><x:ClientData ObjectType="Note"><x:MoveWithCells/><x:SizeWithCells/><x:Anchor>${anchor}</x:Anchor><x:AutoFill>False</x:AutoFill><x:Row>${line - 1}</x:Row><x:Column>${column}</x:Column></x:ClientData></v:shape>`;
  }
  yield '</xml>';
}
