/** Which workbook this page may write. */
export interface WriterLock {
  /** True where this page is (now) the only one to write the workbook. */
  hold(workbookId: string): Promise<boolean>;
  /** The workbook whose lock is held. */
  held(): string | undefined;
  release(): void;
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

  function release(): void {
    current?.release();
    current = undefined;
  }

  function request(workbookId: string): Promise<boolean> {
    return new Promise((resolve, reject) => {
      locks
        .request(`basewright ${workbookId}`, { ifAvailable: true }, (lock) => {
          if (!lock) {
            resolve(false);
            return;
          }
          // Held as long as this promise is open.
          return new Promise<void>((done) => {
            current = { id: workbookId, release: done };
            resolve(true);
          });
        })
        .catch(reject);
    });
  }

  return {
    async hold(workbookId) {
      if (current?.id === workbookId) return true;
      release();
      return request(workbookId);
    },
    held: () => current?.id,
    release,
  };
}
