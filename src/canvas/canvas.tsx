import '@xyflow/react/dist/base.css';
import './canvas.css';

import { ReactFlow, ReactFlowProvider, ViewportPortal, useReactFlow, useStore } from '@xyflow/react';
import { useEffect, useLayoutEffect, useMemo, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';

import { boxOf, type Box } from '#shared/kinds/place.ts';
import { paperSize } from '#shared/layout/paper.ts';
import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Design } from '#shared/model/design.ts';
import { useOpenDesignStore } from '#src/design/open-design.ts';

import { useCanvas, useCanvasStore, type View } from './canvas-store.ts';
import { NODE_TYPES } from './device-node.tsx';
import { createNodeCache } from './devices-as-nodes.ts';
import { pointerHandlers } from './pointer.ts';
import { selectDevice, type Selection } from './selection.ts';
import { LowerLayers, UpperLayers } from './sheet-layers.tsx';
import { useCanvasKeys, type ViewCommands } from './use-canvas-keys.ts';
import { useSheetLayout } from './use-sheet-layout.ts';

const LEAST_ZOOM = 0.15;
const MOST_ZOOM = 6;
/** Below this nobody can read the text, and drawing it only costs. */
const FAR_ZOOM = 0.4;

/** The drawing surface: one sheet of paper on the desk. `children` are laid over it. */
export function Canvas({ children }: { readonly children?: ReactNode }) {
  const frame = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState<{ width: number; height: number } | null>(null);

  useLayoutEffect(() => {
    const element = frame.current;
    if (element === null) return undefined;
    setSize({ width: element.clientWidth, height: element.clientHeight });
    const watch = new ResizeObserver(() => setSize({ width: element.clientWidth, height: element.clientHeight }));
    watch.observe(element);
    return () => watch.disconnect();
  }, []);

  return (
    <div className="canvas" ref={frame}>
      {size !== null && size.width > 0 && (
        <ReactFlowProvider>
          <Surface size={size} />
        </ReactFlowProvider>
      )}
      {children}
    </div>
  );
}

function Surface({ size }: { readonly size: { width: number; height: number } }) {
  const canvas = useCanvasStore();
  const open = useOpenDesignStore();
  const sheetId = useCanvas((state) => state.sheetId);
  const selected = useCanvas((state) => state.selection.devices);
  const { design, layout } = useSheetLayout();
  const [nodesOf] = useState(createNodeCache);
  const nodes = useMemo(() => nodesOf(design, sheetId, selected), [nodesOf, design, sheetId, selected]);
  const [firstView] = useState(() => viewOf(boxOfPaper(open.getState().design, sheetId), size));
  const flow = useReactFlow();
  const isSpaceDown = useSpaceKey();
  const commands = useRef<ViewCommands | null>(null);
  useFlights(design, layout, size);
  useCanvasKeys(canvas, open, commands);

  useEffect(() => {
    commands.current = {
      zoomBy: (factor) => void flow.zoomTo(flow.getZoom() * factor),
      fit: () => canvas.getState().fit(),
    };
  }, [flow, canvas]);

  const handlers = useMemo(
    () =>
      pointerHandlers({
        canvas,
        open,
        view: () => flow.getViewport(),
        isPanning: () => isSpaceDown.current,
      }),
    [canvas, open, flow, isSpaceDown],
  );

  function handleKeyDown(event: KeyboardEvent<HTMLDivElement>) {
    if (event.key !== 'Enter' && event.key !== ' ') return;
    const id =
      event.target instanceof Element ? event.target.closest('.react-flow__node')?.getAttribute('data-id') : null;
    if (id === null || id === undefined) return;
    event.preventDefault();
    canvas.getState().select(selectDevice(id));
  }

  return (
    <div className="surface" role="application" aria-label="Sheet" onKeyDown={handleKeyDown} {...handlers}>
      <ReactFlow
        nodes={nodes}
        nodeTypes={NODE_TYPES}
        defaultViewport={firstView}
        minZoom={LEAST_ZOOM}
        maxZoom={MOST_ZOOM}
        onlyRenderVisibleElements
        nodesDraggable={false}
        nodesConnectable={false}
        elementsSelectable={false}
        nodesFocusable
        edgesFocusable={false}
        disableKeyboardA11y
        panOnDrag={PAN_BUTTONS}
        zoomOnDoubleClick={false}
        selectionKeyCode={null}
        multiSelectionKeyCode={null}
        deleteKeyCode={null}
        zoomActivationKeyCode={null}
        onMove={(_event, view) => {
          if (canvas.getState().unitsPerPixel !== 1 / view.zoom) canvas.setState({ unitsPerPixel: 1 / view.zoom });
        }}
        proOptions={PRO_OPTIONS}
      >
        <SurfaceState />
        <ViewportPortal>
          <LowerLayers design={design} sheetId={sheetId} layout={layout} />
          <UpperLayers design={design} sheetId={sheetId} layout={layout} />
        </ViewportPortal>
      </ReactFlow>
    </div>
  );
}

/** The middle button pans; so does the left one while Space is down. */
const PAN_BUTTONS = [1];
const PRO_OPTIONS = { hideAttribution: true };

/**
 * Says on the surface itself how far the sheet is, what is in hand and what is under it, so that nothing that is drawn
 * subscribes to them.
 */
function SurfaceState() {
  const isFar = useStore(({ transform }) => transform[2] < FAR_ZOOM);
  const toolIs = useCanvas((state) => state.tool.is);
  const hoverOn = useCanvas((state) => state.hover.on);
  const mark = useRef<HTMLSpanElement>(null);
  useLayoutEffect(() => {
    const surface = mark.current?.closest('.surface');
    if (surface != null) surface.className = `surface tool-${toolIs} over-${hoverOn}${isFar ? ' is-far' : ''}`;
  });
  return <span ref={mark} hidden />;
}

function useSpaceKey() {
  const isDown = useRef(false);
  useEffect(() => {
    const down = (event: globalThis.KeyboardEvent) => {
      if (event.code === 'Space') isDown.current = true;
    };
    const up = (event: globalThis.KeyboardEvent) => {
      if (event.code === 'Space') isDown.current = false;
    };
    const lost = () => {
      isDown.current = false;
    };
    document.addEventListener('keydown', down);
    document.addEventListener('keyup', up);
    window.addEventListener('blur', lost);
    return () => {
      document.removeEventListener('keydown', down);
      document.removeEventListener('keyup', up);
      window.removeEventListener('blur', lost);
    };
  }, []);
  return isDown;
}

/** Takes the view where the store says: the whole sheet, or what is selected. */
function useFlights(design: Design, layout: SheetLayout, size: { width: number; height: number }): void {
  const flow = useReactFlow();
  const canvas = useCanvasStore();
  const flight = useCanvas((state) => state.flight);
  const sheetId = useCanvas((state) => state.sheetId);
  const latest = useRef({ design, layout, size });
  useEffect(() => {
    latest.current = { design, layout, size };
  }, [design, layout, size]);

  // The stage got another size, or the paper did, or another sheet lies there: what was shown whole stays whole.
  const paperNow = boxOfPaper(design, sheetId);
  const { width: paperWidth, height: paperHeight } = paperNow;
  const shown = useRef({ paper: paperNow, size });
  useEffect(() => {
    const before = shown.current;
    const paper = { x: 0, y: 0, width: paperWidth, height: paperHeight };
    shown.current = { paper, size };
    const fitted = viewOf(before.paper, before.size);
    const view = flow.getViewport();
    if (Math.abs(view.zoom - fitted.zoom) < 0.01 && Math.abs(view.x - fitted.x) < 2) {
      void flow.setViewport(viewOf(paper, size));
    }
  }, [flow, size, paperWidth, paperHeight]);

  useEffect(() => {
    canvas.setState({ unitsPerPixel: 1 / flow.getZoom() });
    const now = latest.current;
    const paper = boxOfPaper(now.design, sheetId);
    if (flight.to === 'fit') {
      void flow.setViewport(viewOf(paper, now.size), { duration: flight.turn === 0 ? 0 : steadyMs() });
      return;
    }
    const box = boxOfSelection(now.design, now.layout, canvas.getState().selection, sheetId);
    if (box === null) return;
    if (flow.getZoom() >= FAR_ZOOM && isInView(box, flow.getViewport(), now.size)) return;
    const zoom = Math.max(flow.getZoom(), 0.9);
    void flow.setCenter(box.x + box.width / 2, box.y + box.height / 2, { zoom, duration: steadyMs() });
  }, [flow, canvas, flight, sheetId]);
}

/** Wholly, and with a little room round it. */
function isInView(box: Box, { x, y, zoom }: View, size: { width: number; height: number }): boolean {
  const margin = 12;
  return (
    box.x * zoom + x >= margin &&
    box.y * zoom + y >= margin &&
    (box.x + box.width) * zoom + x <= size.width - margin &&
    (box.y + box.height) * zoom + y <= size.height - margin
  );
}

function steadyMs(): number {
  return matchMedia('(prefers-reduced-motion: reduce)').matches ? 0 : 160;
}

function boxOfPaper(design: Design, sheetId: string): Box {
  const sheet = design.sheets[sheetId];
  return { x: 0, y: 0, ...(sheet === undefined ? { width: 960, height: 679 } : paperSize(sheet)) };
}

/** The box whole and in the middle, with a little desk round it; its upper edge near the head. */
function viewOf(box: Box, size: { width: number; height: number }): View {
  const margin = 8;
  const zoom = Math.min((size.width - 2 * margin) / box.width, (size.height - 2 * margin) / box.height, MOST_ZOOM);
  const kept = Math.max(LEAST_ZOOM, zoom);
  return {
    x: (size.width - box.width * kept) / 2 - box.x * kept,
    y: Math.max(margin, (size.height - box.height * kept) / 2) - box.y * kept,
    zoom: kept,
  };
}

function boxOfSelection(design: Design, layout: SheetLayout, selection: Selection, sheetId: string): Box | null {
  const devices = [...selection.devices].flatMap((id) => {
    const device = design.devices[id];
    return device === undefined || device.sheetId !== sheetId ? [] : [boxOf(device)];
  });
  const points = [
    ...devices.flatMap((box) => [box, { x: box.x + box.width, y: box.y + box.height }]),
    ...[...selection.runs].flatMap((id) => layout.runs[id]?.points ?? []),
  ];
  if (points.length === 0) return null;
  const [x, y] = [Math.min(...points.map((p) => p.x)), Math.min(...points.map((p) => p.y))];
  return { x, y, width: Math.max(...points.map((p) => p.x)) - x, height: Math.max(...points.map((p) => p.y)) - y };
}
