/** Hands a file to the browser's own saving. */
export function saveFile(name: string, content: Blob): void {
  const address = URL.createObjectURL(content);
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser reads the address after this turn.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
