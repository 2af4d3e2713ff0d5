/** Offers a text of the page as a file. */
export function saveFile(name: string, type: 'text/csv' | 'image/svg+xml', text: string): void {
  const url = URL.createObjectURL(new Blob([text], { type }));
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  URL.revokeObjectURL(url);
}
