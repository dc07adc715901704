import type { LinearEngine } from './linearEngine';

export function createJavascriptEngine(): LinearEngine {
  throw new Error('not yet');
}
