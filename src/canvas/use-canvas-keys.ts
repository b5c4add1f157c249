import { useEffect, type RefObject } from 'react';
import type { StoreApi } from 'zustand';

import type { OpenDesign } from '#src/design/open-design.ts';

import type { CanvasState } from './canvas-store.ts';
import { commandsOf } from './commands.ts';
import { NOTHING_SELECTED, sizeOfSelection } from './selection.ts';
import { IDLE } from './tools/tool.ts';

export interface ViewCommands {
  zoomBy(factor: number): void;
  fit(): void;
}

/**
 * The keyboard of the drawing screen. A field that is typed in keeps its keys, and so does an open dialog or menu;
 * copying and pasting go through the system's own clipboard.
 */
export function useCanvasKeys(
  canvas: StoreApi<CanvasState>,
  open: StoreApi<OpenDesign>,
  view: RefObject<ViewCommands | null>,
): void {
  useEffect(() => {
    const commands = commandsOf(canvas, open);

    function handleKey(event: KeyboardEvent) {
      const isCommand = event.ctrlKey || event.metaKey;
      if (isCommand && event.key.toLowerCase() === 's') {
        // Everything is saved as it is drawn; the browser's own page saving would only be in the way.
        event.preventDefault();
        return;
      }
      if (event.defaultPrevented || isTyping(event.target) || isElsewhere(event.target)) return;
      if (!isCommand && hasOwnKeys(event.target)) return;
      const did = isCommand ? onCommand(event) : onKey(event);
      if (did) event.preventDefault();
    }

    function onCommand(event: KeyboardEvent): boolean {
      const { undo, redo, mayEdit } = open.getState();
      const key = event.key.toLowerCase();
      if (key === 'a') commands.selectAll();
      else if (!mayEdit) return false;
      else if (key === 'z' && event.shiftKey) redo();
      else if (key === 'z') undo();
      else if (key === 'y') redo();
      else if (key === 'd') commands.duplicate();
      else return false;
      canvas.getState().select(canvas.getState().selection);
      return true;
    }

    function onKey(event: KeyboardEvent): boolean {
      const { happen, selection, tool } = canvas.getState();
      if (happen({ type: 'key', key: event.key, shift: event.shiftKey })) return true;
      if (event.key === '+' || event.key === '=') return did(view.current?.zoomBy(1.2));
      if (event.key === '-') return did(view.current?.zoomBy(1 / 1.2));
      if (event.code === 'Digit1' && event.shiftKey) return did(view.current?.fit());
      if (event.key === 'Escape') {
        const isAnything = sizeOfSelection(selection) > 0 || tool.is !== 'idle';
        canvas.setState({ selection: NOTHING_SELECTED, tool: IDLE });
        return isAnything;
      }
      if (!open.getState().mayEdit || tool.is !== 'idle') return false;
      if (event.key === 'Delete' || event.key === 'Backspace') {
        return sizeOfSelection(selection) > 0 && did(commands.deleteSelected());
      }
      if (event.key.toLowerCase() === 'r' && !event.altKey) return did(commands.rotate());
      const way = ARROWS[event.key];
      if (way === undefined || selection.devices.size === 0) return false;
      const steps = event.shiftKey ? 5 : 1;
      return did(commands.nudge(way[0] * steps, way[1] * steps));
    }

    function handleClipboard(event: ClipboardEvent) {
      if (isTyping(event.target) || isElsewhere(event.target) || event.clipboardData === null) return;
      if (event.type === 'paste') {
        if (!open.getState().mayEdit) return;
        if (commands.paste(event.clipboardData.getData('text/plain'), null)) event.preventDefault();
        return;
      }
      if (!isNothingMarked()) return;
      const text = event.type === 'cut' && open.getState().mayEdit ? commands.cut() : commands.copy();
      if (text === null) return;
      event.clipboardData.setData('text/plain', text);
      event.preventDefault();
    }

    document.addEventListener('keydown', handleKey);
    for (const type of ['copy', 'cut', 'paste'] as const) document.addEventListener(type, handleClipboard);
    return () => {
      document.removeEventListener('keydown', handleKey);
      for (const type of ['copy', 'cut', 'paste'] as const) document.removeEventListener(type, handleClipboard);
    };
  }, [canvas, open, view]);
}

const ARROWS: Readonly<Record<string, readonly [number, number]>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

function did(_done: void): true {
  return true;
}

/** Text that a person has marked on the page is theirs to copy. */
function isNothingMarked(): boolean {
  return (getSelection()?.toString() ?? '') === '';
}

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName))
  );
}

/** In a dialog or a menu, whose keys mean something else. */
function isElsewhere(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest('[role="dialog"], [role="menu"]') !== null;
}

/** The ledger has arrows and Enter of its own; undo and its like mean the same there. */
function hasOwnKeys(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest('[data-own-keys]') !== null;
}
