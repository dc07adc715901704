/** Brings a document of one version to the next. Untrusted data: may throw, and must not change what it is given. */
export type Migration = (document: Readonly<Record<string, unknown>>) => Record<string, unknown>;

/** One step a version, by the version it starts from. Version 1 is the first, so there is none yet. */
export const MIGRATIONS: Readonly<Record<number, Migration>> = {};

/** The document brought up to the target version; undefined where a step is missing. */
export function migrate(
  document: Readonly<Record<string, unknown>>,
  from: number,
  target: number,
  migrations: Readonly<Record<number, Migration>>,
): Record<string, unknown> | undefined {
  let current: Record<string, unknown> = { ...document };
  for (let version = from; version < target; version += 1) {
    const step = Object.hasOwn(migrations, version) ? migrations[version] : undefined;
    if (!step) return undefined;
    current = { ...step(current), version: version + 1 };
  }
  return current;
}
