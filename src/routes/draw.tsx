import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useState } from 'react';
import { useParams, useSearchParams } from 'react-router';

import { basisOf, sheetOf } from '#shared/model/defaults.ts';
import type { Design } from '#shared/model/design.ts';
import { CanvasContext, createCanvasStore, useCanvas, useCanvasStore } from '#src/canvas/canvas-store.ts';
import { readSelection, writeSelection } from '#src/canvas/selection.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { DrawScreen } from '#src/features/draw/draw-screen.tsx';
import { revisionsQuery } from '#src/features/revisions/revisions-api.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import type { IssueFacts } from '#symbols/sheet/title-fields.ts';

import { usePageTitle } from './page-title.ts';
import { useVesselContext } from './vessel-layout.tsx';

/** `/vessels/:vesselId/draw?sheet=1&select=W12`: the sheet and the selection stand in the address. */
export function DrawRoute() {
  const open = useOpenDesignStore();
  const [search] = useSearchParams();
  const { sheetId: sheetInPath } = useParams();
  const units = useUnits(basisOf(open.getState().design).units);
  const [canvas] = useState(() => {
    const { design } = open.getState();
    const selection = readSelection(search.get('select') ?? '', design);
    const asked = sheetNamed(design, search.get('sheet') ?? sheetInPath ?? null);
    const store = createCanvasStore(open, { sheetId: asked ?? firstSheet(design), selection, units });
    if (selection.devices.size + selection.runs.size > 0) store.getState().show(selection);
    return store;
  });

  useEffect(() => {
    canvas.setState({ units });
  }, [canvas, units]);

  const facts = useIssueFacts();
  useEffect(() => {
    canvas.setState({ facts });
  }, [canvas, facts]);

  return (
    <CanvasContext value={canvas}>
      <Address />
      <DrawScreen />
    </CanvasContext>
  );
}

/** What stands in the title block beside the design: as it would be printed now. */
function useIssueFacts(): IssueFacts {
  const { me, vessel } = useVesselContext();
  const seq = useOpenDesign((open) => open.seq);
  const revisions = useQuery(revisionsQuery(vessel.vesselId)).data;
  const latest = revisions?.toSorted((a, b) => b.issuedAt.localeCompare(a.issuedAt))[0];
  const isAsIssued = latest?.seq === seq;
  const [created, legalOwner] = [me.name, vessel.shopName];
  return useMemo(() => {
    if (latest === undefined) return { legalOwner, created };
    if (!isAsIssued) return { legalOwner, created, revision: `${latest.letter} +` };
    return { legalOwner, created, revision: latest.letter, issued: latest.issuedAt.slice(0, 10) };
  }, [legalOwner, created, latest, isAsIssued]);
}

/** Keeps the address, the selection and the design in step. */
function Address() {
  const canvas = useCanvasStore();
  const design = useOpenDesign((open) => open.design);
  const sheetId = useCanvas((state) => state.sheetId);
  const selection = useCanvas((state) => state.selection);
  const [search, setSearch] = useSearchParams();
  const [written, setWritten] = useState<string | null>(null);
  const vesselName = design.vessel?.name ?? 'Vessel';
  const sheet = design.sheets[sheetId];
  usePageTitle(
    `${vesselName}, ${sheet === undefined ? 'draw' : sheetOf(sheet).title || `sheet ${sheetOf(sheet).number}`}`,
  );

  // Others, and undo, take away what is selected and the sheet one stands on.
  useEffect(() => {
    canvas.getState().select(canvas.getState().selection);
    if (!Object.hasOwn(design.sheets, canvas.getState().sheetId)) canvas.getState().openSheet(firstSheet(design));
  }, [canvas, design]);

  const number = sheet === undefined ? '' : String(sheetOf(sheet).number);
  const marks = writeSelection(selection, design);
  useEffect(() => {
    const next = new URLSearchParams();
    next.set('sheet', number);
    if (marks !== '' && marks.length < 1500) next.set('select', marks);
    const text = next.toString();
    if (text === written) return;
    setWritten(text);
    setSearch(next, { replace: true, preventScrollReset: true });
  }, [number, marks, written, setSearch]);

  // A link on this very page, or Back: the address leads.
  useEffect(() => {
    if (written === null || search.toString() === written) return;
    const now = canvas.getState();
    const asked = sheetNamed(design, search.get('sheet'));
    if (asked !== undefined && asked !== now.sheetId) now.openSheet(asked);
    const wanted = readSelection(search.get('select') ?? '', design);
    if (wanted.devices.size + wanted.runs.size > 0) canvas.getState().show(wanted);
    // The design changing under the address is no new address.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [search]);

  return null;
}

function sheetNamed(design: Design, name: string | null): string | undefined {
  if (name === null) return undefined;
  if (Object.hasOwn(design.sheets, name)) return name;
  return Object.values(design.sheets).find((sheet) => String(sheetOf(sheet).number) === name)?.id;
}

function firstSheet(design: Design): string {
  const sheets = Object.values(design.sheets).toSorted((a, b) => sheetOf(a).number - sheetOf(b).number);
  return sheets[0]?.id ?? '';
}
