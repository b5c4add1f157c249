import { connect } from '#shared/edits/connect.ts';
import { setLength } from '#shared/edits/set-field.ts';
import { applyPatches } from '#shared/model/patch.ts';
import { readLengthM } from '#shared/units/length.ts';
import { isSamePoint, snap } from '#src/canvas/grid.ts';
import { CATCH_UNITS, hitTerminal } from '#src/canvas/hit.ts';
import { selectRun } from '#src/canvas/selection.ts';

import { IDLE, type EndAt, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Drawing = Extract<Tool, { is: 'drawing-run' }>;

/**
 * A run on its way from a terminal: a click sets a bend, a terminal ends it, Backspace takes back the last figure of
 * the length or the last bend, Escape lets go of it all. A length may be typed while it is drawn.
 */
export function onDrawingRun(tool: Drawing, happening: Happening, world: World): Outcome {
  switch (happening.type) {
    case 'move':
      return { tool: follow(tool, happening.at, world) };
    case 'down': {
      const now = follow(tool, happening.at, world);
      return now.over === null ? { tool: { ...addBend(now), isPressed: true } } : end(now, now.over, world);
    }
    case 'up': {
      const now = follow(tool, happening.at, world);
      if (!tool.isPressed) return { tool: now };
      // The drag that began the run ends it where it meets a terminal; anywhere else it goes on by clicks.
      return now.over === null ? { tool: { ...addBend(now), isPressed: false } } : end(now, now.over, world);
    }
    case 'key':
      return onKey(tool, happening.key, world);
    case 'cancel':
      return { tool: IDLE };
    case 'double':
      return { tool };
  }
}

function onKey(tool: Drawing, key: string, world: World): Outcome {
  if (key === 'Escape') return { tool: IDLE, handled: true };
  if (key === 'Backspace') {
    if (tool.typed !== '') return { tool: { ...tool, typed: tool.typed.slice(0, -1) }, handled: true };
    return { tool: { ...tool, bends: tool.bends.slice(0, -1) }, handled: true };
  }
  if (key === 'Enter') {
    return tool.over === null ? { tool, handled: true } : end(tool, tool.over, world);
  }
  const isOfLength = /^[0-9.,/'" ]$/.test(key) || (tool.typed !== '' && /^[a-z]$/i.test(key));
  if (isOfLength && tool.typed.length < 20) return { tool: { ...tool, typed: tool.typed + key }, handled: true };
  return { tool };
}

function follow(tool: Drawing, at: { x: number; y: number }, world: World): Drawing {
  return { ...tool, pointer: at, over: hitTerminal(world, at, CATCH_UNITS, tool.from) ?? null };
}

function addBend(tool: Drawing): Drawing {
  const bend = snap(tool.pointer);
  const last = tool.bends.at(-1) ?? tool.from.at;
  return isSamePoint(bend, last) ? tool : { ...tool, bends: [...tool.bends, bend] };
}

function end(tool: Drawing, to: EndAt, world: World): Outcome {
  const added = connect(
    world.design,
    {
      from: { device: tool.from.device, terminal: tool.from.terminal },
      to: { device: to.device, terminal: to.terminal },
      bends: tool.bends,
    },
    world.newId,
  );
  if (added.runId === undefined) return { tool, handled: true };
  const lengthM = tool.typed === '' ? undefined : readLengthM(tool.typed, world.units);
  const drawn = applyPatches(world.design, added.patches);
  const measured = lengthM === undefined || lengthM === 0 ? [] : setLength(drawn, added.runId, lengthM).patches;
  return {
    tool: IDLE,
    edit: { label: added.label, patches: [...added.patches, ...measured] },
    selection: selectRun(added.runId),
    handled: true,
  };
}
