/** Hands text to the browser as a file to keep. */
export function saveText(text: string, fileName: string, mediaType = 'text/csv;charset=utf-8'): void {
  saveBlob(new Blob([text], { type: mediaType }), fileName);
}

/** Hands a file to the browser to keep. */
export function saveBlob(blob: Blob, fileName: string): void {
  const address = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser reads the address after the click: release it a little later.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}
