/** Which workbook this page may write. */
export interface WriterLock {
  /** True where this page is (now) the only one to write the workbook. */
  hold(workbookId: string): Promise<boolean>;
  /** The workbook whose lock is held. */
  held(): string | undefined;
  release(): void;
}

/** A page that is being reloaded lets go of its lock a moment after the new one asks [ms]. */
const PATIENCE_MS = 500;

function nameOf(error: unknown): string | undefined {
  return typeof error === 'object' && error !== null && 'name' in error ? String(error.name) : undefined;
}

/** Without Web Locks every page writes, as browsers without them always did. */
export function unguarded(): WriterLock {
  let id: string | undefined;
  return {
    async hold(workbookId) {
      id = workbookId;
      return true;
    },
    held: () => id,
    release() {
      id = undefined;
    },
  };
}

/** One writer a workbook, over all pages of this browser, through Web Locks. */
export function webLock(locks: LockManager): WriterLock {
  let current: { id: string; release(): void } | undefined;
  let asking: { id: string; answer: Promise<boolean> } | undefined;

  function release(): void {
    current?.release();
    current = undefined;
  }

  function request(id: string): Promise<boolean> {
    return new Promise((resolve, reject) => {
      // Held as long as the promise of the callback is open.
      const holdOpen = () =>
        new Promise<void>((done) => {
          release();
          current = { id, release: done };
          resolve(true);
        });
      locks
        .request(`basewright ${id}`, { signal: AbortSignal.timeout(PATIENCE_MS) }, holdOpen)
        .catch((error: unknown) => {
          const tooLate = nameOf(error) === 'TimeoutError' || nameOf(error) === 'AbortError';
          if (tooLate) resolve(false);
          else reject(error);
        });
    });
  }

  return {
    async hold(id) {
      if (current?.id === id) return true;
      if (asking?.id === id) return asking.answer;
      release();
      const mine = { id, answer: request(id) };
      asking = mine;
      try {
        return await mine.answer;
      } finally {
        if (asking === mine) asking = undefined;
      }
    },
    held: () => current?.id,
    release,
  };
}
