import { expect, vi } from 'vitest';
import { type Case, disagreements, type Solve } from './judge';

/** The engine as it is loaded now, mocked modules included. */
export async function loadedEngine(): Promise<Solve> {
  vi.resetModules();
  const { createEngine, solveBlend } = await import('../../../src/index');
  const linearEngine = await createEngine();
  return (order) => solveBlend(order, { linearEngine, timeLimitMs: 2000 });
}

/** What the judge finds wrong with the engine as it is loaded now. */
export async function verdict(cases: readonly Case[]): Promise<string[]> {
  return disagreements(await loadedEngine(), cases);
}

export function expectCaught(found: readonly string[], cases: number): void {
  console.info(`${found.length} disagreements over ${cases} orders, the first: ${found[0]}`);
  expect(found.length).toBeGreaterThanOrEqual(2);
}
