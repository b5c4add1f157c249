import { execFile } from 'node:child_process';
import { promisify } from 'node:util';

const run = promisify(execFile);

/** A PDF as poppler's tools see it. */
export interface PdfFacts {
  /** The text of each page, in reading order. */
  readonly pages: readonly string[];
  /** Width and height of each page, mm. */
  readonly papersMm: readonly { readonly width: number; readonly height: number }[];
  readonly fonts: readonly { readonly name: string; readonly isEmbedded: boolean }[];
  readonly images: number;
}

export async function readPdf(path: string): Promise<PdfFacts> {
  const [info, fonts, images, text] = await Promise.all([
    run('pdfinfo', ['-l', '-1', path]),
    run('pdffonts', [path]),
    run('pdfimages', ['-list', path]),
    run('pdftotext', ['-layout', path, '-']),
  ]);
  return {
    pages: text.stdout.split('\f').slice(0, -1),
    papersMm: [...info.stdout.matchAll(/^Page\s+\d+ size:\s+([\d.]+) x ([\d.]+) pts/gm)].map((size) => ({
      width: (Number(size[1]) / 72) * 25.4,
      height: (Number(size[2]) / 72) * 25.4,
    })),
    // Columns: name, type, encoding, emb, sub, uni, object ID.
    fonts: fonts.stdout
      .trim()
      .split('\n')
      .slice(2)
      .map((line) => ({ name: line.split(/\s+/)[0]!, isEmbedded: / yes +(yes|no) +(yes|no) +\d+ +\d+ *$/.test(line) })),
    images: images.stdout.trim().split('\n').slice(2).length,
  };
}

/** How often a mark stands on a page as a word of its own. */
export function countMark(page: string, mark: string): number {
  return [...page.matchAll(new RegExp(`(?<![\\w.:/])${mark}(?![\\w/])`, 'g'))].length;
}
