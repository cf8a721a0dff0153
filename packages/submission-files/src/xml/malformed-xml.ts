/** Thrown where text is not the XML that workbooks consist of. Says what kind of thing was met, never its content. */
export class MalformedXml extends Error {
  constructor(readonly found: string) {
    super(`The XML has ${found}.`);
  }
}
