/**
 * A boat's profile, drawn to the scale of its list: our own outlines, chosen by words in its type, stretched to its
 * length with the waterline in one place. A sketch to tell boats apart, not a survey.
 */
export function HullProfile({
  type,
  lengthM,
  pxPerM,
  says,
  height = 148,
}: {
  readonly type: string | null;
  readonly lengthM: number | null;
  readonly pxPerM: number;
  /** The length as the reader measures. */
  readonly says: string;
  readonly height?: number;
}) {
  const hull = hullOf(type, lengthM);
  const width = (lengthM ?? UNKNOWN_LENGTH_M) * pxPerM;
  const k = width / hull.width;
  const half = Math.max(26, says.length * 3.6);
  return (
    <svg
      className="hull"
      viewBox={`-12 0 440 ${height}`}
      role="img"
      aria-label={`Profile, ${says}`}
      preserveAspectRatio="xMinYMid meet"
    >
      <g transform={`translate(0 ${WATERLINE - WATERLINE * k}) scale(${k})`}>
        <path className="zone" d={hull.engine} />
        <path className="hull-line" d={hull.hull} />
        <path className="hull-fine" d={hull.fittings} />
      </g>
      <path className="waterline" d={`M-8 ${WATERLINE}H${width + 10}`} />
      <g className="dimension" strokeDasharray={lengthM === null ? '3 3' : undefined}>
        <path d={`M0 133V143M${width} 133V143M0 138H${width}`} />
      </g>
      <path className="arrow" d={`M0 138l9 -2.5v5zM${width} 138l-9 -2.5v5z`} />
      <rect className="gap" x={width / 2 - half} y={131} width={half * 2} height={14} />
      <text x={width / 2} y={142} textAnchor="middle">
        {says}
      </text>
    </svg>
  );
}

/** The same outline without measures, for a picture of what could be. */
export function HullSketch({ type, transform }: { readonly type: string; readonly transform: string }) {
  const hull = hullOf(type, null);
  return (
    <g transform={transform}>
      <path className="hull-line" d={hull.hull} />
      <path className="hull-fine" d={hull.fittings} />
    </g>
  );
}

/** The scale at which every boat of a list fits its strip: along by the longest, upright by the tallest. */
export function scaleOfList(
  vessels: readonly { readonly type: string | null; readonly lengthM: number | null }[],
  most = 416,
): number {
  const limits = vessels.map(({ type, lengthM }) => {
    const hull = hullOf(type, lengthM);
    const lengthOrGuess = lengthM ?? UNKNOWN_LENGTH_M;
    const upright = Math.min(88 / (WATERLINE - hull.top), 34 / (hull.bottom - WATERLINE));
    return Math.min(most / lengthOrGuess, (upright * hull.width) / lengthOrGuess);
  });
  return Math.min(most / 4, ...limits);
}

const WATERLINE = 94;
const UNKNOWN_LENGTH_M = 8;

interface Hull {
  readonly width: number;
  readonly top: number;
  readonly bottom: number;
  readonly hull: string;
  readonly fittings: string;
  readonly engine: string;
}

const SAILER: Hull = {
  width: 301.6,
  top: 4,
  bottom: 122,
  hull: 'M4 62C10 84 20 100 34 104H261.6C281.6 98 295.6 74 301.6 52C211 68 106 72 4 62ZM90.5 67L99.5 40H166L181 66M187 65V8M184 8V65M187 20L297.6 53M34 104L52 122H187L217 104',
  fittings: 'M108.6 44H132.7V54H106.2ZM138.7 44H162.9L167.4 54H138.7ZM181 14l6 -4l4 6l6 -4',
  engine: 'M78.4 78H138.7V103H78.4Z',
};
const TRAWLER: Hull = {
  width: 416,
  top: 4,
  bottom: 124,
  hull: 'M2 54C6 82 12 100 22 106H370C394 98 408 70 416 34C374 46 324 56 258 60H125L108 54ZM208 60V20H274.6L291 57M200 20H283M125 60V38H208M237 20V4M237 8H258M22 106L30 124H291L370 106',
  fittings:
    'M220.5 28H245.4V42H220.5ZM253.8 28H272.5L278.7 42H253.8ZM141.4 45H162.2V52H141.4ZM174.7 45H195.5V52H174.7Z',
  engine: 'M116.5 76H208V104H116.5Z',
};
const OPEN_BOAT: Hull = {
  width: 150.8,
  top: 46,
  bottom: 112,
  hull: 'M8 70C10 88 12 98 18 102H125C137 96 145 80 150.8 64C113 72 60 76 8 70ZM54 74V56H72.4L78.4 74',
  fittings:
    'M60.3 56L57.3 46M-6 66C-6 56 6 54 8 58V72H-4ZM0 72L-2 102H4L6 72M-4 88H8M-4 102C-4 108 0 110 4 108V102M-6 100V112',
  engine: '',
};
const SLOOP: Hull = {
  width: 280,
  top: -2,
  bottom: 130,
  hull: 'M6 66C20 88 60 104 120 105C190 104 250 84 280 58C200 68 90 70 6 66ZM100 68L108 54H176L190 64M150 64V0M150 2L276 58M150 4L10 62M112 105L122 130H162L168 104M34 90L30 118H46L58 98',
  fittings: 'M116 58H134V63H116ZM142 58H164V63H142Z',
  engine: 'M84 78H124V98H84Z',
};
const CRUISER: Hull = {
  width: 320,
  top: 26,
  bottom: 112,
  hull: 'M2 62L8 104C80 110 200 110 256 102C288 92 308 74 320 50C240 58 100 62 2 62ZM70 60L84 34H170L206 56M92 34V26H148',
  fittings: 'M92 40H122V52H86ZM130 40H166L184 54H130ZM214 62H244',
  engine: 'M30 76H92V102H30Z',
};

/** By what its type says, else by its length. */
function hullOf(type: string | null, lengthM: number | null): Hull {
  const words = (type ?? '').toLowerCase();
  if (/skiff|open|dinghy|tender|rib|runabout|launch|centre|center/.test(words)) return OPEN_BOAT;
  if (/motor-?\s?sail|pilothouse|ketch|schooner/.test(words)) return SAILER;
  if (/sail|sloop|cutter|yawl|cat\b/.test(words)) return SLOOP;
  if (/trawl|workboat|fish|tug|barge|narrow|steel/.test(words)) return TRAWLER;
  if (/cruiser|motor|power|express|yacht/.test(words)) return CRUISER;
  if (lengthM !== null && lengthM < 7) return OPEN_BOAT;
  return lengthM !== null && lengthM > 14 ? TRAWLER : CRUISER;
}
