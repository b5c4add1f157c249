import { terminalAt, type Point } from '#shared/kinds/place.ts';
import type { Design } from '#shared/model/design.ts';
import { screenInk } from '#symbols/ink.ts';
import { DeviceSymbol } from '#symbols/sheet/device-symbol.tsx';

import { draftPoints } from './draft-path.ts';
import { snap } from './grid.ts';
import { boxBetween } from './tools/marquee.ts';
import { cornerOf, ghostOf, sizeOfArmed } from './tools/placing.ts';
import type { Armed, Tool } from './tools/tool.ts';

/** What is in hand and not yet in the design: a run on its way, a device to be placed, a marquee. */
export function DraftLayer({ tool, design }: { readonly tool: Tool; readonly design: Design }) {
  if (tool.is === 'drawing-run') return <DraftRun tool={tool} design={design} />;
  if (tool.is === 'marquee') {
    return <rect className="marquee" {...boxBetween(tool.start, tool.at)} />;
  }
  if (tool.is === 'placing' && tool.at !== null) return <Ghost armed={tool.armed} at={tool.at} />;
  return null;
}

function DraftRun({ tool, design }: { readonly tool: Extract<Tool, { is: 'drawing-run' }>; readonly design: Design }) {
  const device = design.devices[tool.from.device];
  const side = (device && terminalAt(device, tool.from.terminal)?.sides[0]) ?? 'right';
  const pointer = tool.over?.at ?? snap(tool.pointer);
  const points = draftPoints(tool.from.at, side, tool.bends, pointer);
  const says = [
    tool.over === null ? '' : `${design.devices[tool.over.device]?.mark ?? ''} : ${tool.over.terminal}`,
    tool.typed === '' ? 'type its length' : tool.typed,
  ].filter(Boolean);
  return (
    <>
      <path className="draft-axis" d={`M${pointer.x} ${pointer.y - 200}v400M${pointer.x - 200} ${pointer.y}h400`} />
      <path className="draft-run" d={points.map((p, i) => `${i === 0 ? 'M' : 'L'}${p.x} ${p.y}`).join('')} />
      {tool.bends.map((bend) => (
        <path key={`${bend.x}:${bend.y}`} className="grip" d={`M${bend.x} ${bend.y - 5}l5 5l-5 5l-5 -5Z`} />
      ))}
      <circle className="catch" cx={tool.from.at.x} cy={tool.from.at.y} r={5.5} />
      {tool.over !== null && <circle className="catch" cx={pointer.x} cy={pointer.y} r={7} />}
      {says.map((line, i) => (
        <text
          key={line}
          className={line === 'type its length' ? 'draft-says quiet' : 'draft-says'}
          x={pointer.x + 12}
          y={pointer.y + 16 + 12 * i}
        >
          {line}
        </text>
      ))}
    </>
  );
}

function Ghost({ armed, at }: { readonly armed: Armed; readonly at: Point }) {
  const corner = cornerOf(armed, at);
  if (armed.what === 'fuse-panel') {
    return <rect className="ghost-box" {...corner} {...sizeOfArmed(armed)} />;
  }
  return (
    <g className="ghost" transform={`translate(${corner.x} ${corner.y})`}>
      <DeviceSymbol device={ghostOf(armed.partId)} ink={screenInk} />
    </g>
  );
}
