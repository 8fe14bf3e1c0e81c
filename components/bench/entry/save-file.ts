/** Hands a file made on the phone to the browser's own saving; nothing leaves the phone. */
export function saveFile(name: string, mediaType: string, text: string): void {
  const address = URL.createObjectURL(new Blob([text], { type: mediaType }));
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser reads the file after this call; a minute is ample for what fits on a phone.
  setTimeout(() => URL.revokeObjectURL(address), 60_000);
}
