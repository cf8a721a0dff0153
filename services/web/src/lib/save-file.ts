/** Hands a text, or bytes, to the reader as a file, made on the spot. */
export function saveFile(name: string, content: string | ArrayBuffer, type: string): void {
  const address = URL.createObjectURL(new Blob([content], { type }));
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
  URL.revokeObjectURL(address);
}
