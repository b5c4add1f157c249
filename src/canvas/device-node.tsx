import type { NodeProps } from '@xyflow/react';
import { memo } from 'react';

import { screenInk } from '#symbols/ink.ts';
import { DeviceSymbol } from '#symbols/sheet/device-symbol.tsx';

import type { DeviceNode } from './devices-as-nodes.ts';

/** A device in the viewport: its symbol, and nothing that would subscribe to panning and zooming. */
export const DeviceOnSheet = memo(
  function DeviceOnSheet({ data }: NodeProps<DeviceNode>) {
    return (
      <svg className="sheet device" width="100%" height="100%" aria-hidden="true">
        <DeviceSymbol device={data.device} ink={screenInk} />
      </svg>
    );
  },
  (before, after) => before.data === after.data,
);

export const NODE_TYPES = { device: DeviceOnSheet };
