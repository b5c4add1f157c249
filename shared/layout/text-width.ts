/**
 * How wide a text is, in sheet units, where there is no page to measure it on. Advance widths in thousandths of the
 * type height from the fonts we ship: Inter 600 (a regular text is a little narrower) and the mono face.
 */
const INTER = [
  252, 321, 523, 644, 650, 1004, 663, 326, 373, 373, 540, 673, 319, 465, 319, 379, 660, 423, 623, 636, 666, 612, 640,
  576, 640, 640, 319, 329, 673, 673, 673, 543, 999, 728, 659, 737, 722, 605, 588, 749, 746, 277, 580, 703, 565, 922,
  759, 769, 645, 773, 652, 650, 660, 736, 728, 1020, 720, 713, 652, 373, 379, 373, 481, 469, 351, 574, 624, 583, 624,
  591, 389, 625, 612, 262, 262, 569, 262, 900, 612, 609, 624, 624, 397, 549, 353, 612, 587, 839, 569, 588, 566, 455,
  359, 455, 673,
] as const;

/** What the table lacks (umlauts, Greek, Cyrillic) counts as a wide lower-case letter. */
const OTHER = 650;
const MONO = 632;

export function textWidth(text: string, size: number): number {
  let thousandths = 0;
  for (const letter of text) thousandths += INTER[letter.codePointAt(0)! - 32] ?? OTHER;
  return (thousandths * size) / 1000;
}

export function monoWidth(text: string, size: number): number {
  return ([...text].length * MONO * size) / 1000;
}

/** Lines no wider than `width`; a word wider than that stands alone on its line. */
export function wrapText(text: string, size: number, width: number): string[] {
  return text.split('\n').flatMap((paragraph) => {
    const lines: string[] = [];
    for (const word of paragraph.split(/ +/)) {
      const last = lines.at(-1);
      if (last !== undefined && textWidth(`${last} ${word}`, size) <= width)
        lines[lines.length - 1] = `${last} ${word}`;
      else lines.push(word);
    }
    return lines;
  });
}
