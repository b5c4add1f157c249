import { formatNumber, readQuantity } from './number.ts';

export const TEMPERATURE_ACCEPTED = 'Type a temperature such as 30, 30 °C or 86 °F.';

/** `105 °C`: the trade rates insulation in degrees Celsius under either way of measuring. */
export function formatC(celsius: number): string {
  return `${formatNumber(celsius, 1)} °C`;
}

/** In degrees Celsius: `30`, `30 °C`, `30C`, `86 °F`. */
export function readCelsius(text: string): number | undefined {
  const celsius = readQuantity(text.replace(/°\s+/, '°'), { '°C': 1, C: 1 });
  if (celsius !== undefined) return celsius;
  const fahrenheit = readQuantity(text.replace(/°\s+/, '°'), { '°F': 1, F: 1 });
  return fahrenheit === undefined ? undefined : Math.round(((fahrenheit - 32) / 1.8) * 100) / 100;
}
