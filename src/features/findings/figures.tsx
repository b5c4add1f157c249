/** A message with its figures bold: currents, voltages, shares, lengths. Sizes and temperatures stay plain. */
export function Figures({ message }: { readonly message: string }) {
  return (
    <>{message.split(FIGURE).map((part, i) => (i % 2 === 1 ? <b key={i}>{part}</b> : <span key={i}>{part}</span>))}</>
  );
}

const FIGURE =
  /(?<![\w/.])(\d[\d,]*(?:\.\d+)?\s?(?:kA|mA|A|mV|kV|V|%|kW|W|Ah|Ω|mΩ|ft(?: \d+(?: 1\/2)? in)?|in|mm|cm|m))(?![\w²])/;
