/** Puts text on the clipboard, also where the host grants the page no clipboard of its own. Rejects where neither way works. */
export async function copyText(text: string): Promise<void> {
  try {
    await navigator.clipboard.writeText(text);
  } catch {
    if (!copyBySelection(text)) throw new Error('the clipboard is closed');
  }
}

function copyBySelection(text: string): boolean {
  const field = document.createElement('textarea');
  const focused = document.activeElement;
  field.value = text;
  document.body.append(field);
  field.select();
  const isCopied = document.execCommand('copy');
  field.remove();
  if (focused instanceof HTMLElement) focused.focus();
  return isCopied;
}
