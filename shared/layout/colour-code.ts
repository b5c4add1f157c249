import type { PlainColour } from '#shared/model/design.ts';
import type { FullBasis } from '#shared/model/defaults.ts';

/** Code letters of a run's colour: IEC 60757 under ISO 13297; in ABYC practice the shorter ones the trade writes. */
export function colourCode(colour: string, profile: FullBasis['profile']): string {
  const letters = profile === 'iso-13297' ? IEC : ABYC;
  const parts = colour.split('/').map((part) => letters[part as PlainColour] ?? '');
  return profile === 'iso-13297' ? parts.join('') : parts.join('/');
}

const IEC: Readonly<Record<PlainColour, string>> = {
  red: 'RD',
  black: 'BK',
  yellow: 'YE',
  green: 'GN',
  white: 'WH',
  blue: 'BU',
  // IEC 60757 has one blue; the neutral's is told by its duty
  'light-blue': 'BU',
  brown: 'BN',
  orange: 'OG',
  violet: 'VT',
  grey: 'GY',
  tan: 'TN',
  pink: 'PK',
};

const ABYC: Readonly<Record<PlainColour, string>> = {
  red: 'R',
  black: 'BK',
  yellow: 'Y',
  green: 'G',
  white: 'W',
  blue: 'BU',
  'light-blue': 'LB',
  brown: 'BR',
  orange: 'O',
  violet: 'V',
  grey: 'GY',
  tan: 'T',
  pink: 'PK',
};
