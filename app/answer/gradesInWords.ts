import { type BlendOutcome, gradesOfViscosity } from '../../src';

/** "Inside the KV40 window of ISO VG 46; …": windows of the published grades, no claim to a grade. */
export function gradesInWords({ properties }: Pick<BlendOutcome, 'properties'>): string {
  const kv = (celsius: number) =>
    properties?.properties.find((entry) => entry.property === 'kv' && entry.celsius === celsius)?.value;
  const [kv40, kv100] = [kv(40), kv(100)];
  const windows = gradesOfViscosity({ ...(kv40 !== undefined && { kv40 }), ...(kv100 !== undefined && { kv100 }) });
  if (windows.length === 0) return 'Inside no viscosity window of ISO 3448, SAE J300 or SAE J306.';
  const words = windows.map((window) => window.words.replace(/^inside /, ''));
  return `Inside ${words.join('; ')}.`;
}
