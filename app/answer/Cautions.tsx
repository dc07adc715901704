import type { Caution } from '../../src';
import { Notice } from '../parts/Notice';
import styles from './AnswerPanel.module.css';

/** A call for a trial blend: it stands out, before the recipe. */
export function TrialCalls({ cautions }: { cautions: readonly Caution[] }) {
  return trialCalls(cautions).map(({ call, reasons }) => (
    <Notice key={call} tone="warn" className={styles.trial}>
      <b>{call}</b> {reasons.join(' ')}
    </Notice>
  ));
}

/** What else to mind of the predicted properties. */
export function Cautions({ cautions }: { cautions: readonly Caution[] }) {
  const others = cautions.filter(({ kind }) => kind !== 'trial blend');
  if (others.length === 0) return null;
  return (
    <ul className={styles.cautions}>
      {[...new Set(others.map(({ message }) => message))].map((message) => (
        <li key={message}>{message}</li>
      ))}
    </ul>
  );
}

/** "Make a trial blend first:" said once, with all its reasons after it. */
function trialCalls(cautions: readonly Caution[]): { call: string; reasons: string[] }[] {
  const calls = new Map<string, string[]>();
  for (const { kind, message } of cautions) {
    if (kind !== 'trial blend') continue;
    const [, call = message, reason = ''] = /^(.*?[:.])\s+(.*)$/s.exec(message) ?? [];
    const reasons = calls.get(call) ?? [];
    calls.set(call, reasons.includes(reason) ? reasons : [...reasons, reason]);
  }
  return [...calls].map(([call, reasons]) => ({ call, reasons }));
}
