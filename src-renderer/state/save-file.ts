/** Hands a file to the reviewer, who says where it goes. */
export function saveFile(name: string, content: Blob): void {
  const url = URL.createObjectURL(content);
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.click();
  // Once the saving has begun.
  setTimeout(() => URL.revokeObjectURL(url), 60_000);
}
