import { useCallback, useEffect, useMemo, useRef, useState, type KeyboardEvent, type RefObject } from 'react';

import { compareMarks } from '#shared/layout/mark-order.ts';
import type { Finding } from '#shared/model/analysis.ts';
import { basisOf } from '#shared/model/defaults.ts';
import { useCanvas, useCanvasStore } from '#src/canvas/canvas-store.ts';
import { selectRun } from '#src/canvas/selection.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Check } from '#src/ui/check.tsx';

import { TypedCell } from './ledger-cell.tsx';
import { COLUMNS, type Column, type LedgerFacts, type LedgerRow } from './ledger-columns.tsx';
import { sayColour, sayEnd, sayZones } from './run-words.ts';
import { useSetField } from './use-edit.ts';

interface Place {
  readonly runId: string;
  readonly column: string;
}

/** Every run as a line that edits in place, in step with the sheet. Only the lines in view are in the page. */
export function Ledger({ rowHeight, isNarrow }: { readonly rowHeight: number; readonly isNarrow: boolean }) {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const sheetId = useCanvas((canvas) => canvas.sheetId);
  const selected = useCanvas((canvas) => canvas.selection.runs);
  const hovered = useCanvas(({ hover }) => (hover.on === 'run' ? hover.run : null));
  const canvas = useCanvasStore();
  const units = useUnits(basisOf(design).units);
  const [sought, setSought] = useState('');
  const [isSheetOnly, setIsSheetOnly] = useState(false);
  const [active, setActive] = useState<Place | null>(null);
  const [typing, setTyping] = useState<{ readonly place: Place; readonly first: string | null } | null>(null);
  const columns = useMemo(() => COLUMNS.filter((column) => !(isNarrow && column.wideOnly === true)), [isNarrow]);
  const facts = useMemo(() => ({ design, analysis, units }), [design, analysis, units]);
  const findings = useMemo(() => findingsByRun(analysis?.findings), [analysis]);
  const rows = useMemo(
    () => rowsOf(facts, findings, sought, isSheetOnly ? sheetId : null),
    [facts, findings, sought, isSheetOnly, sheetId],
  );
  const onThisSheet = useMemo(() => rowsOf(facts, findings, '', sheetId).length, [facts, findings, sheetId]);
  const scroller = useRef<HTMLDivElement>(null);
  const seen = useSeenRows(scroller, rows.length, rowHeight);
  const setField = useSetField();
  const table = useRef<HTMLTableElement>(null);

  const goTo = useCallback(
    (rowIndex: number, columnIndex: number) => {
      const row = rows[Math.max(0, Math.min(rows.length - 1, rowIndex))];
      const column = columns[Math.max(0, Math.min(columns.length - 1, columnIndex))];
      if (row === undefined || column === undefined) return;
      setActive({ runId: row.run.id, column: column.key });
      setTyping(null);
      canvas.getState().show(selectRun(row.run.id));
      requestAnimationFrame(() =>
        table.current
          ?.querySelector<HTMLElement>(`[data-place="${CSS.escape(`${row.run.id}/${column.key}`)}"]`)
          ?.focus({ preventScroll: true }),
      );
    },
    [rows, columns, canvas],
  );

  // The run chosen on the sheet comes into view here.
  const onlySelected = selected.size === 1 ? [...selected][0]! : null;
  useEffect(() => {
    const index = onlySelected === null ? -1 : rows.findIndex(({ run }) => run.id === onlySelected);
    const view = scroller.current;
    if (index < 0 || view === null) return;
    const top = index * rowHeight;
    const head = 20;
    if (top < view.scrollTop) view.scrollTop = top;
    else if (top + rowHeight + head > view.scrollTop + view.clientHeight) {
      view.scrollTop = top + rowHeight + head - view.clientHeight;
    }
    // Only a new choice scrolls; what is typed elsewhere does not.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [onlySelected]);

  function handleKey(event: KeyboardEvent<HTMLTableElement>) {
    if (active === null || typing !== null || event.ctrlKey || event.metaKey || event.altKey) return;
    const row = rows.findIndex(({ run }) => run.id === active.runId);
    const column = columns.findIndex(({ key }) => key === active.column);
    const way = { ArrowUp: [-1, 0], ArrowDown: [1, 0], ArrowLeft: [0, -1], ArrowRight: [0, 1] }[event.key];
    const isPlainKey = event.key.length === 1 && event.key !== ' ';
    if (way !== undefined) goTo(row + way[0]!, column + way[1]!);
    else if (event.key === 'Home') goTo(row, 0);
    else if (event.key === 'End') goTo(row, columns.length - 1);
    else if (event.key === 'Enter' || event.key === 'F2') begin(active, null);
    else if (isPlainKey) begin(active, event.key);
    else return;
    event.preventDefault();
  }

  function begin(place: Place, first: string | null) {
    if (mayEdit && columns.find(({ key }) => key === place.column)?.edit !== undefined) setTyping({ place, first });
  }

  return (
    <div className="ledger-table" data-own-keys>
      <div className="ledger-head">
        <b>Runs</b>
        <span className="quiet">
          {onThisSheet} on this sheet, {Object.keys(design.runs).length} in all
        </span>
        <label className="ledger-find">
          <input
            type="search"
            aria-label="Filter runs"
            placeholder="Filter"
            value={sought}
            onChange={(event) => setSought(event.currentTarget.value)}
          />
        </label>
        <Check className="ledger-choice quiet" checked={isSheetOnly} onChange={setIsSheetOnly}>
          This sheet only
        </Check>
      </div>
      <div className="ledger-scroll" ref={scroller}>
        {/* A grid whose cells take the keyboard. */}
        <table
          className="led"
          role="grid"
          aria-label="Run ledger"
          aria-rowcount={rows.length}
          ref={table}
          onKeyDown={handleKey}
        >
          <colgroup>
            {columns.map((column, index) => (
              <col key={column.key} style={index === columns.length - 1 ? undefined : { width: column.width }} />
            ))}
          </colgroup>
          <thead>
            <tr>
              {columns.map((column) => (
                <th key={column.key} scope="col" className={column.right ? 'r' : undefined}>
                  {column.title}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {seen.from > 0 && <tr aria-hidden="true" className="spacer" style={{ height: seen.from * rowHeight }} />}
            {rows.slice(seen.from, seen.to).map((row, offset) => (
              <LedgerLine
                key={row.run.id}
                row={row}
                index={seen.from + offset}
                columns={columns}
                facts={facts}
                isOn={selected.has(row.run.id)}
                isHovered={hovered === row.run.id}
                active={active?.runId === row.run.id ? active.column : null}
                typing={typing?.place.runId === row.run.id ? typing : null}
                onPoint={(column, index) => {
                  const isAgain = active?.runId === row.run.id && active.column === column;
                  goTo(
                    index,
                    columns.findIndex(({ key }) => key === column),
                  );
                  if (isAgain) begin({ runId: row.run.id, column }, null);
                }}
                onKeep={(path, value) => setField(path, value)}
                onLeave={(index, column, way) => {
                  const at = columns.findIndex(({ key }) => key === column);
                  setTyping(null);
                  if (way === 'down') goTo(index + 1, at);
                  else if (way === 'right') goTo(index, at + 1);
                  else if (way === 'left') goTo(index, at - 1);
                  else goTo(index, at);
                }}
              />
            ))}
            {seen.to < rows.length && (
              <tr aria-hidden="true" className="spacer" style={{ height: (rows.length - seen.to) * rowHeight }} />
            )}
          </tbody>
        </table>
        {rows.length === 0 && (
          <p className="ledger-empty quiet">
            {sought === ''
              ? 'No runs yet. Drag from a terminal of one device to a terminal of another.'
              : 'No run fits this filter.'}
          </p>
        )}
      </div>
    </div>
  );
}

function LedgerLine({
  row,
  index,
  columns,
  facts,
  isOn,
  isHovered,
  active,
  typing,
  onPoint,
  onKeep,
  onLeave,
}: {
  readonly row: LedgerRow;
  readonly index: number;
  readonly columns: readonly Column[];
  readonly facts: LedgerFacts;
  readonly isOn: boolean;
  readonly isHovered: boolean;
  readonly active: string | null;
  readonly typing: { readonly place: Place; readonly first: string | null } | null;
  readonly onPoint: (column: string, index: number) => void;
  readonly onKeep: (path: readonly string[], value: unknown) => void;
  readonly onLeave: (index: number, column: string, way: 'stay' | 'down' | 'right' | 'left') => void;
}) {
  const { run } = row;
  return (
    <tr
      className={[isOn && 'on', isHovered && 'hovered'].filter(Boolean).join(' ') || undefined}
      aria-selected={isOn}
      aria-rowindex={index + 2}
      data-run={run.mark}
    >
      {columns.map((column) => {
        const isTyped = typing?.place.column === column.key;
        const place = `${run.id}/${column.key}`;
        return (
          <td
            key={column.key}
            role="gridcell"
            className={[
              column.right && 'r',
              column.mono && 'mono',
              column.edit && 'edits',
              active === column.key && 'active',
            ]
              .filter(Boolean)
              .join(' ')}
            data-place={place}
            tabIndex={active === column.key || (active === null && index === 0 && column.key === 'mark') ? 0 : -1}
            onPointerDown={(event) => {
              if (!isTyped && event.button === 0) onPoint(column.key, index);
            }}
          >
            {isTyped && column.edit !== undefined ? (
              <TypedCell
                text={column.edit.text(row, facts)}
                label={`${column.title} of ${run.mark ?? 'the run'}`}
                first={typing.first}
                read={(text) => column.edit!.read(text, run, facts)}
                onKeep={(value) => onKeep(column.edit!.path(run), value)}
                onLeave={(way) => onLeave(index, column.key, way)}
              />
            ) : (
              column.show(row, facts)
            )}
          </td>
        );
      })}
    </tr>
  );
}

const NONE: readonly Finding[] = [];

function findingsByRun(findings: readonly Finding[] | undefined): ReadonlyMap<string, readonly Finding[]> {
  const byRun = new Map<string, Finding[]>();
  for (const finding of findings ?? []) {
    const { run } = finding.subject;
    if (run !== undefined) byRun.set(run, [...(byRun.get(run) ?? []), finding]);
  }
  return byRun;
}

function rowsOf(
  facts: LedgerFacts,
  findings: ReadonlyMap<string, readonly Finding[]>,
  sought: string,
  sheetId: string | null,
): LedgerRow[] {
  const { design } = facts;
  const words = sought.toLowerCase().split(/\s+/).filter(Boolean);
  return Object.values(design.runs)
    .filter((run) => {
      const ends = [design.devices[run.from.device], design.devices[run.to.device]];
      if (sheetId !== null && !ends.some((device) => device?.sheetId === sheetId)) return false;
      if (words.length === 0) return true;
      const text = [
        run.mark,
        sayEnd(design, run.from),
        sayEnd(design, run.to),
        ends[0]?.name,
        ends[1]?.name,
        run.conductor.size,
        sayColour(design, run),
        sayZones(design, run),
        run.note,
      ]
        .join(' ')
        .toLowerCase();
      return words.every((word) => text.includes(word));
    })
    .toSorted(compareMarks)
    .map((run) => ({ run, findings: findings.get(run.id) ?? NONE }));
}

/** The lines in view and a few beyond. */
function useSeenRows(scroller: RefObject<HTMLDivElement | null>, count: number, rowHeight: number) {
  const [view, setView] = useState({ top: 0, height: 600 });
  useEffect(() => {
    const element = scroller.current;
    if (element === null) return undefined;
    const read = () => setView({ top: element.scrollTop, height: element.clientHeight });
    read();
    const watch = new ResizeObserver(read);
    watch.observe(element);
    element.addEventListener('scroll', read, { passive: true });
    return () => {
      watch.disconnect();
      element.removeEventListener('scroll', read);
    };
  }, [scroller]);
  const from = Math.max(0, Math.floor(view.top / rowHeight) - 5);
  return { from, to: Math.min(count, Math.ceil((view.top + view.height) / rowHeight) + 5) };
}
