/** Locks of one browser, shared by several pages: as much of Web Locks as is used. */
export function fakeLocks({ answersAfterMs = 0 } = {}): LockManager {
  const held = new Set<string>();

  async function request(name: string, { ifAvailable }: LockOptions, callback: (lock: Lock | null) => unknown) {
    if (!ifAvailable) throw new Error('Waiting for a lock is not done here.');
    if (answersAfterMs > 0) await new Promise((resolve) => setTimeout(resolve, answersAfterMs));
    if (held.has(name)) return callback(null);
    held.add(name);
    try {
      return await callback({ name, mode: 'exclusive' });
    } finally {
      held.delete(name);
    }
  }
  // The overloads and the query are not used here.
  return { request, query: () => Promise.resolve({}) } as unknown as LockManager;
}
