type Method = 'error' | 'warn';

/** Listens to console.error and console.warn, so that a test can fail on what it did not expect. */
export class ConsoleGuard {
  private readonly messages: string[] = [];
  private readonly expected: RegExp[] = [];
  private readonly originals = new Map<Method, (...args: unknown[]) => void>();

  constructor(private readonly target: Pick<Console, Method>) {}

  start(): void {
    for (const method of ['error', 'warn'] as const) {
      this.originals.set(method, this.target[method]);
      this.target[method] = (...args: unknown[]) =>
        void this.messages.push(`console.${method}: ${args.map(textOf).join(' ')}`);
    }
  }

  /** A message that matches is part of this test. */
  expect(pattern: RegExp): void {
    this.expected.push(pattern);
  }

  /** Ends listening. Throws for a message nobody expected, and for an expected one that did not come. */
  finish(): void {
    for (const [method, original] of this.originals) this.target[method] = original;
    const unexpected = this.messages.filter((message) => !this.expected.some((pattern) => pattern.test(message)));
    const missing = this.expected.filter((pattern) => !this.messages.some((message) => pattern.test(message)));
    if (unexpected.length > 0) throw new Error(`Unexpected messages on the console:\n${unexpected.join('\n')}`);
    if (missing.length > 0) throw new Error(`Expected on the console, but missing: ${missing.join(', ')}`);
  }
}

function textOf(value: unknown): string {
  return value instanceof Error ? (value.stack ?? value.message) : String(value);
}
