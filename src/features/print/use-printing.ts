import { useEffect, useRef, useState } from 'react';

import type { Analysis } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { formatNumber } from '#shared/units/number.ts';

import type { DrawingSetOptions } from './make-pdf.ts';

export type PrintingState =
  | { readonly is: 'idle' }
  | { readonly is: 'making'; readonly at: string; readonly fraction: number }
  | { readonly is: 'made'; readonly file: string; readonly size: string }
  | { readonly is: 'failed'; readonly says: string };

/** Makes the set and hands it to the reader's downloads; can be cancelled between two pages. */
export function usePrinting() {
  const [state, setState] = useState<PrintingState>({ is: 'idle' });
  const stop = useRef<AbortController | null>(null);
  useEffect(() => () => stop.current?.abort(), []);

  async function make(work: {
    readonly design: Design;
    readonly analysis: Analysis | null;
    readonly file: string;
    readonly options: Omit<DrawingSetOptions, 'onProgress' | 'signal'>;
  }): Promise<void> {
    const aborting = new AbortController();
    stop.current = aborting;
    setState({ is: 'making', at: 'Fetching what prints', fraction: 0 });
    try {
      // Heavy, and only for those who print.
      const { makeDrawingSet } = await import('./make-pdf.ts');
      const blob = await makeDrawingSet(work.design, work.analysis, {
        ...work.options,
        signal: aborting.signal,
        onProgress: (done, all, now) => setState({ is: 'making', at: now, fraction: all === 0 ? 1 : done / all }),
      });
      download(blob, work.file);
      setState({ is: 'made', file: work.file, size: sayBytes(blob.size) });
    } catch (error) {
      if (aborting.signal.aborted) setState({ is: 'idle' });
      else setState({ is: 'failed', says: error instanceof Error ? error.message : 'Try again.' });
    }
  }

  return { state, make, cancel: () => stop.current?.abort() };
}

/** `minnow-TQE-0003-A.pdf`: what a shop finds again among its files. */
export function fileNameOf(design: Design, revision: string | null): string {
  const parts = [design.vessel?.name ?? 'drawing', design.vessel?.drawingNumber, revision ?? undefined];
  const name = parts
    .filter((part) => part !== undefined && part !== '')
    .map((part) => part!.trim().replace(/[^\p{L}\p{N}._-]+/gu, '-'))
    .join('-');
  return `${name.charAt(0).toLowerCase()}${name.slice(1)}.pdf`;
}

function download(blob: Blob, file: string): void {
  const address = URL.createObjectURL(blob);
  const link = document.createElement('a');
  link.href = address;
  link.download = file;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser has taken it by then, also a slow one.
  setTimeout(() => URL.revokeObjectURL(address), 60_000);
}

function sayBytes(bytes: number): string {
  return bytes < 1_000_000
    ? `${formatNumber(Math.ceil(bytes / 1000), 0)} kB`
    : `${formatNumber(bytes / 1_000_000, 1)} MB`;
}
