/** Line breaks (CR, LF or CRLF, each one) in a piece of text. */
export function countLineBreaks(text: string): number {
  let breaks = 0;
  for (let at = 0; at < text.length; at += 1) {
    const character = text.charCodeAt(at);
    if (character === 10 || (character === 13 && text.charCodeAt(at + 1) !== 10)) breaks += 1;
  }
  return breaks;
}
