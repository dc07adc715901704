/** What the app takes from its surroundings, in one place, so that tests can stand in for it. */
export interface Environment {
  newId(): string;
  /** The page's clock [ms]. */
  now(): number;
  /** Date and time, ISO 8601. */
  today(): string;
  indexedDB?: IDBFactory;
  locks?: LockManager;
  localStorage?: Storage;
  /** Of this window alone; survives a reload. */
  sessionStorage?: Storage;
  /** Hands a text to the user as a file. */
  download(fileName: string, text: string): void;
  /** Calls back when the page is hidden or left. */
  onLeaving(callback: () => void): void;
  /** Has the browser ask before the page is left, where this says so at that moment. */
  askBeforeLeaving(unsaved: () => boolean): void;
  /** Calls back once something is on screen. */
  afterFirstPaint(callback: () => void): void;
}

function attempt<T>(read: () => T): T | undefined {
  try {
    return read();
  } catch {
    // Reading these properties itself throws where the browser refuses storage.
    return undefined;
  }
}

function downloadText(fileName: string, text: string): void {
  const url = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = url;
  link.download = fileName;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 10_000);
}

/** 128 random bits in hexadecimal. `crypto.randomUUID` is not there on a page served over plain http. */
function randomId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}

/** The browser the page runs in. */
export function browserEnvironment(): Environment {
  return {
    newId: randomId,
    now: () => performance.now(),
    today: () => new Date().toISOString(),
    indexedDB: attempt(() => window.indexedDB),
    locks: attempt(() => navigator.locks),
    localStorage: attempt(() => window.localStorage),
    sessionStorage: attempt(() => window.sessionStorage),
    download: downloadText,
    onLeaving(callback) {
      window.addEventListener('pagehide', callback);
      document.addEventListener('visibilitychange', () => document.visibilityState === 'hidden' && callback());
    },
    askBeforeLeaving(unsaved) {
      window.addEventListener('beforeunload', (event) => {
        if (unsaved()) event.preventDefault();
      });
    },
    afterFirstPaint(callback) {
      let called = false;
      const once = () => {
        if (!called) callback();
        called = true;
      };
      requestAnimationFrame(() => setTimeout(once, 0));
      // A page opened in the background paints no frame.
      setTimeout(once, 500);
    },
  };
}

let current: Environment | undefined;

/** The surroundings in use; the browser unless a test put others in place. */
export function environment(): Environment {
  current ??= browserEnvironment();
  return current;
}

export function setEnvironment(surroundings: Environment): void {
  current = surroundings;
}
