/** Gives a text to the browser to keep as a file. */
export function saveFile(name: string, text: string, type: string): void {
  const url = URL.createObjectURL(new Blob([text], { type: `${type};charset=utf-8` }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  // The download has begun by the next turn; the text need not stay in memory.
  setTimeout(() => URL.revokeObjectURL(url), 1000);
}
