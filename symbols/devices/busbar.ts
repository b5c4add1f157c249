import { unturnedSize } from '#shared/kinds/place.ts';

import { boxPath, defineDrawing } from './drawing.ts';

export const busbar = defineDrawing({
  kind: 'busbar',
  art: (device) => {
    const { width } = unturnedSize(device);
    return { strokes: '', fills: boxPath(0, 4, width, 8), terminals: 'studs' };
  },
});
