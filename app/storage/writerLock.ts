/** Which workbook this page may write. */
export interface WriterLock {
  /** True where this page is (now) the only one to write the workbook. */
  hold(workbookId: string): Promise<boolean>;
  /** The workbook whose lock is held. */
  held(): string | undefined;
  release(): void;
}

/**
 * A page that is being reloaded lets go of its lock a moment after the new one asks, so it is asked several times.
 * Each answer is the browser's own: a busy computer that answers late is not taken for another tab.
 */
const TRIES = 12;
const BETWEEN_TRIES_MS = 50;

const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));

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

  /** True where the lock was free; it is held from then on. */
  function take(id: string): Promise<boolean> {
    return new Promise((resolve, reject) => {
      locks
        .request(`basewright ${id}`, { ifAvailable: true }, (lock) => {
          if (!lock) return resolve(false);
          // Held as long as the promise of the callback is open.
          return new Promise<void>((done) => {
            release();
            current = { id, release: done };
            resolve(true);
          });
        })
        .catch(reject);
    });
  }

  async function request(id: string): Promise<boolean> {
    for (let tries = 1; ; tries += 1) {
      if (await take(id)) return true;
      if (tries === TRIES) return false;
      await pause(BETWEEN_TRIES_MS);
    }
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
