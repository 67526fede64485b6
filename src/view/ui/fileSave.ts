/** Hands the text to the browser as a download; nothing leaves the machine. */
export function fileSave(name: string, text: string): void {
  const address = URL.createObjectURL(new Blob([text], { type: "application/json" }));
  const link = document.createElement("a");
  link.href = address;
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The download reads the blob after this turn; freeing it at once empties the file in some browsers.
  setTimeout(() => URL.revokeObjectURL(address), 60_000);
}
