import { onScopeDispose } from 'vue';
import { useSession } from '../state/use-session.ts';

/** Keys that work everywhere: the command list, and undo and redo outside of text fields, which have their own. */
export function useKeys({ openCommands }: { openCommands: () => void }): void {
  const { undo, redo } = useSession();

  function onKey(event: KeyboardEvent): void {
    if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
    const key = event.key.toLowerCase();
    const isDialogOpen = document.querySelector('dialog[open]') !== null;
    if (isDialogOpen) return;
    if (key === 'k') run(event, openCommands);
    if (isTyping(event.target)) return;
    if (key === 'z') run(event, event.shiftKey ? redo : undo);
    if (key === 'y') run(event, redo);
  }

  addEventListener('keydown', onKey);
  onScopeDispose(() => removeEventListener('keydown', onKey));
}

function run(event: KeyboardEvent, action: () => unknown): void {
  event.preventDefault();
  void action();
}

function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  if (target instanceof HTMLInputElement) return !['checkbox', 'radio', 'button', 'file'].includes(target.type);
  return target instanceof HTMLTextAreaElement || target.isContentEditable;
}
