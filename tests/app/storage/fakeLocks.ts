/** Locks of one browser, shared by several pages: as much of Web Locks as is used. */
export function fakeLocks(): LockManager {
  const held = new Set<string>();
  async function request(
    name: string,
    options: LockOptions,
    callback: (lock: Lock | null) => unknown,
  ): Promise<unknown> {
    if (options.ifAvailable && held.has(name)) return callback(null);
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
