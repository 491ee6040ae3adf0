/**
 * Puts text on the clipboard. The window of the desktop application refuses every permission, the clipboard's too;
 * copying a selection, which a press of a button allows, needs none.
 *
 * @throws when neither way is open
 */
export async function copyText(text: string): Promise<void> {
  try {
    await navigator.clipboard.writeText(text);
  } catch {
    copySelection(text);
  }
}

function copySelection(text: string): void {
  const focused = document.activeElement;
  const area = document.createElement('textarea');
  area.value = text;
  area.className = 'for-screen-readers';
  // Inside an open dialog nothing outside it can be selected.
  (document.querySelector('dialog[open]') ?? document.body).append(area);
  area.select();
  const hasCopied = document.execCommand('copy');
  area.remove();
  if (focused instanceof HTMLElement) focused.focus();
  if (!hasCopied) throw new Error('copying is not allowed here');
}
