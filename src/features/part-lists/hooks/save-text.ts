/** Hands a text made in the browser to the person as a file. */
export function saveText({ fileName, text }: { fileName: string; text: string }): void {
  const address = URL.createObjectURL(new Blob([text], { type: 'text/csv;charset=utf-8' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  URL.revokeObjectURL(address);
}
