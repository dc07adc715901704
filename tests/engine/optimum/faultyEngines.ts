import type { createHighsEngine } from '../../../src/index';
import { mulberry32 } from '../../oracle/mulberry32';

export type LinearEngine = Awaited<ReturnType<typeof createHighsEngine>>;
type Session = ReturnType<LinearEngine['open']>;
type Result = ReturnType<Session['solve']>;

/** An engine whose every answer passes through `spoil`. */
export function spoiled(
  engine: LinearEngine,
  name: string,
  spoil: (result: Result, random: () => number) => Result,
): LinearEngine {
  return {
    name,
    open(program) {
      const session = engine.open(program);
      const random = mulberry32(program.cost.length * 7919 + program.rows.length);
      return { ...session, solve: () => spoil(session.solve(), random) };
    },
  };
}

/** Answers "unknown" to a third of what it is asked. */
export function forgetful(engine: LinearEngine): LinearEngine {
  return spoiled(engine, 'forgetful', (result, random) => (random() < 0.35 ? { status: 'unknown' } : result));
}

/** Right about the solution, wrong about every dual: up to a tenth off, or of the wrong sign. */
export function careless(engine: LinearEngine): LinearEngine {
  return spoiled(engine, 'careless', (result, random) =>
    result.status === 'optimal'
      ? { ...result, duals: result.duals.map((dual) => dual * (0.9 + 0.2 * random()) * (random() < 0.02 ? -1 : 1)) }
      : result,
  );
}

/** Now and then calls a program infeasible that is not, with a ray made of its duals. */
export function liar(engine: LinearEngine): LinearEngine {
  return spoiled(engine, 'liar', (result, random) =>
    result.status === 'optimal' && random() < 0.25 ? { status: 'infeasible', ray: result.duals } : result,
  );
}
