import { describe, expect, it } from 'vitest';
import { ConsoleGuard } from '../support/consoleGuard';

function guarded(
  act: (target: { error: (text: string) => void; warn: (text: string) => void }) => void,
  expected: RegExp[] = [],
) {
  const target = { error: () => {}, warn: () => {} };
  const guard = new ConsoleGuard(target);
  guard.start();
  for (const pattern of expected) guard.expect(pattern);
  act(target);
  return () => guard.finish();
}

describe('ConsoleGuard', () => {
  it('fails on an error and on a warning that nobody expected', () => {
    expect(guarded((target) => target.error('act(...) is missing'))).toThrow('console.error: act(...) is missing');
    expect(guarded((target) => target.warn('deprecated'))).toThrow('console.warn: deprecated');
  });

  it('passes silence and expected messages, and fails when an expected one does not come', () => {
    expect(guarded(() => {})).not.toThrow();
    expect(guarded((target) => target.warn('deprecated'), [/deprecated/])).not.toThrow();
    expect(guarded(() => {}, [/deprecated/])).toThrow('missing: /deprecated/');
  });

  it('gives the console back', () => {
    const error = () => {};
    const target = { error, warn: () => {} };
    const guard = new ConsoleGuard(target);
    guard.start();
    expect(target.error).not.toBe(error);
    guard.finish();
    expect(target.error).toBe(error);
  });
});
