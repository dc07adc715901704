import { Notice } from '../parts/Notice';

/** Said where the program could not start at all. */
export function Unopened({ reason }: { reason: string }) {
  return (
    <main>
      <Notice tone="bad" live>
        Basewright could not start: {reason}. Nothing stored on this computer was changed. Load the page again; if that
        does not help, try another browser.
      </Notice>
    </main>
  );
}
