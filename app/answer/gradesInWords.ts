import { type BlendOutcome, gradesOfViscosity } from '../../src';

/** "Inside the KV40 window of ISO VG 46, and the KV100 windows of SAE 20, SAE J306 75.": windows, no claim to a grade. */
export function gradesInWords({ properties }: Pick<BlendOutcome, 'properties'>): string {
  // Rounded a little: a mix held at the end of a window lies a rounding of the search beside it.
  const kv = (celsius: number) => {
    const value = properties?.properties.find((entry) => entry.property === 'kv' && entry.celsius === celsius)?.value;
    return value === undefined ? undefined : Number(value.toPrecision(9));
  };
  const [kv40, kv100] = [kv(40), kv(100)];
  const windows = gradesOfViscosity({ ...(kv40 !== undefined && { kv40 }), ...(kv100 !== undefined && { kv100 }) });
  const parts = [40, 100].flatMap((celsius) => {
    const grades = windows.filter((window) => window.celsius === celsius).map(({ grade }) => grade.id);
    return grades.length
      ? [`the KV${celsius} ${grades.length > 1 ? 'windows' : 'window'} of ${grades.join(', ')}`]
      : [];
  });
  if (parts.length === 0) return 'Inside no viscosity window of ISO 3448, SAE J300 or SAE J306.';
  return `Inside ${parts.join(', and ')}.`;
}
