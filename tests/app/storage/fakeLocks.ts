/** Locks of one browser, shared by several pages: as much of Web Locks as is used. */
export function fakeLocks(): LockManager {
  const queues = new Map<string, Promise<unknown>>();

  async function request(name: string, { signal }: LockOptions, callback: (lock: Lock) => unknown): Promise<unknown> {
    const before = queues.get(name) ?? Promise.resolve();
    let gaveUp = false;
    const turn = before.then(() => (gaveUp ? undefined : callback({ name, mode: 'exclusive' })));
    queues.set(name, turn);
    const late = new Promise<never>((_resolve, reject) => {
      signal?.addEventListener('abort', () => {
        gaveUp = true;
        reject(signal.reason);
      });
    });
    // Once granted, the signal has no say any more.
    await Promise.race([before, late]);
    return turn;
  }
  // The overloads and the query are not used here.
  return { request, query: () => Promise.resolve({}) } as unknown as LockManager;
}
