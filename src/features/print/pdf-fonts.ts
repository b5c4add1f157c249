import inter400 from '@expo-google-fonts/inter/400Regular/Inter_400Regular.ttf?url';
import inter600 from '@expo-google-fonts/inter/600SemiBold/Inter_600SemiBold.ttf?url';
import mono500 from '@expo-google-fonts/atkinson-hyperlegible-mono/500Medium/AtkinsonHyperlegibleMono_500Medium.ttf?url';
import mono700 from '@expo-google-fonts/atkinson-hyperlegible-mono/700Bold/AtkinsonHyperlegibleMono_700Bold.ttf?url';
import type { jsPDF } from 'jspdf';

export const TEXT_FONT = 'Inter';
export const MONO_FONT = 'Atkinson Hyperlegible Mono';

/** Every weight a sheet is set in: one that is missing here would fall back to another face without a word. */
const CUTS = [
  { family: TEXT_FONT, weight: 400, file: 'Inter-400.ttf', url: inter400 },
  { family: TEXT_FONT, weight: 600, file: 'Inter-600.ttf', url: inter600 },
  { family: MONO_FONT, weight: 500, file: 'Mono-500.ttf', url: mono500 },
  { family: MONO_FONT, weight: 700, file: 'Mono-700.ttf', url: mono700 },
] as const;

export async function loadFonts(): Promise<LoadedFont[]> {
  return Promise.all(
    CUTS.map(async ({ family, weight, file, url }) => {
      const answer = await fetch(url);
      if (!answer.ok) throw new Error(`The font ${file} could not be loaded.`);
      const bytes = await answer.arrayBuffer();
      // text is measured in the page before it is set in the PDF, so the page must have the very same cut
      const face = new FontFace(family, bytes, { weight: String(weight) });
      document.fonts.add(await face.load());
      return { family, weight, file, face, base64: toBase64(new Uint8Array(bytes)) };
    }),
  );
}

/** The page's own text must not be set in these cuts once the PDF is made. */
export function unloadFonts(fonts: readonly LoadedFont[]): void {
  for (const { face } of fonts) document.fonts.delete(face);
}

export interface LoadedFont {
  readonly family: string;
  readonly weight: number;
  readonly file: string;
  readonly face: FontFace;
  readonly base64: string;
}

export function embedFonts(doc: jsPDF, fonts: readonly LoadedFont[]): void {
  for (const { family, weight, file, base64 } of fonts) {
    doc.addFileToVFS(file, base64);
    doc.addFont(file, family, 'normal', weight);
  }
}

function toBase64(bytes: Uint8Array): string {
  let binary = '';
  for (let i = 0; i < bytes.length; i += 0x8000) binary += String.fromCharCode(...bytes.subarray(i, i + 0x8000));
  return btoa(binary);
}
