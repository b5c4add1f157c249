import './draw.css';

import { useState, type CSSProperties } from 'react';

import { Canvas } from '#src/canvas/canvas.tsx';
import { useCanvas, useCanvasStore } from '#src/canvas/canvas-store.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { EdgeTab } from '#src/ui/edge-tab.tsx';

import { Ledger } from './ledger.tsx';
import { Locker } from './locker.tsx';
import { Particulars } from './particulars.tsx';
import { Peek } from './peek.tsx';
import { PhoneFindings } from './phone-findings.tsx';
import { Pull } from './pull.tsx';
import { SheetTabs } from './sheet-tabs.tsx';
import { Strip } from './strip.tsx';
import { useWidth } from './use-width.ts';

const CLOSED = 24;
const RESTING = 178;

/** The drawing screen: the sheet in the middle, locker and particulars beside it, the ledger below, the findings. */
export function DrawScreen() {
  const width = useWidth();
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const [isLockerOpen, setIsLockerOpen] = useState(true);
  const [isParticularsOpen, setIsParticularsOpen] = useState(true);
  /** Where they lie over the stage, one at a time. */
  const [over, setOver] = useState<'locker' | 'particulars' | null>(null);
  const [ledgerHeight, setLedgerHeight] = useState(width === 'tablet' ? 420 : RESTING);

  const isDesk = width === 'desk';
  const hasLocker = mayEdit && width !== 'phone';
  const showsLocker = hasLocker && (isDesk ? isLockerOpen : over === 'locker');
  const showsParticulars = width !== 'phone' && (isDesk ? isParticularsOpen : over === 'particulars');

  return (
    <main id="page" className={`draw is-${width}`} style={{ '--ledger': `${ledgerHeight}px` } as CSSProperties}>
      {isDesk && showsLocker && <Locker />}
      <section className="stage" aria-label="Drawing">
        <div className="paper-place">
          <Canvas>
            <InHand />
          </Canvas>
          {!isDesk && showsLocker && (
            <div className="over left">
              <Locker onArm={() => setOver(null)} />
            </div>
          )}
          {!isDesk && showsParticulars && (
            <div className="over right">
              <Particulars />
            </div>
          )}
          {hasLocker && (
            <EdgeTab
              side="left"
              className={isDesk ? 'fold' : undefined}
              open={showsLocker}
              aria-label={isDesk && showsLocker ? 'Locker' : undefined}
              onClick={() => (isDesk ? setIsLockerOpen(!isLockerOpen) : setOver(over === 'locker' ? null : 'locker'))}
            >
              {isDesk && showsLocker ? '' : 'Locker'}
            </EdgeTab>
          )}
          {width !== 'phone' && (
            <EdgeTab
              side="right"
              className={isDesk ? 'fold' : undefined}
              open={showsParticulars}
              aria-label={isDesk && showsParticulars ? 'Particulars' : undefined}
              onClick={() =>
                isDesk
                  ? setIsParticularsOpen(!isParticularsOpen)
                  : setOver(over === 'particulars' ? null : 'particulars')
              }
            >
              {isDesk && showsParticulars ? '' : <ParticularsTab />}
            </EdgeTab>
          )}
        </div>
        <SheetTabs />
      </section>
      {isDesk && showsParticulars && <Particulars />}
      {!isDesk && <Peek onParticulars={width === 'phone' ? undefined : () => setOver('particulars')} />}
      {width !== 'phone' && (
        <section className="ledger" aria-label="Runs">
          <Pull height={ledgerHeight} closed={isDesk ? CLOSED : 40} resting={RESTING} onPull={setLedgerHeight} />
          <Ledger rowHeight={isDesk ? 22 : 40} isNarrow={!isDesk} />
        </section>
      )}
      {width === 'phone' && <PhoneFindings />}
      <Strip />
    </main>
  );
}

/** What is in hand, in words, with the way to let go of it. */
function InHand() {
  const tool = useCanvas((canvas) => canvas.tool.is);
  const canvas = useCanvasStore();
  if (tool !== 'placing' && tool !== 'drawing-run') return null;
  return (
    <p className="in-hand" role="status">
      {tool === 'placing'
        ? 'Click where it stands; hold Shift to place another.'
        : 'Click to bend, on a terminal to end; type its length on the way.'}
      <Button look="plain" kbd="Esc" onClick={() => canvas.getState().happen({ type: 'cancel' })}>
        Let go
      </Button>
    </p>
  );
}

function ParticularsTab() {
  const selection = useCanvas((canvas) => canvas.selection);
  const design = useOpenDesign((open) => open.design);
  const [id] = [...selection.devices, ...selection.runs];
  const mark = id === undefined ? undefined : (design.devices[id]?.mark ?? design.runs[id]?.mark);
  return (
    <>
      Particulars
      {mark !== undefined && <b className="mono">{mark}</b>}
    </>
  );
}
