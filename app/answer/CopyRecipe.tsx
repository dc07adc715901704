import { useState } from 'react';
import { Button } from '../parts/Button';
import styles from './RecipeTable.module.css';

const DONE = 'Copied: paste it into a spreadsheet.';
const REFUSED = 'The browser did not allow copying. Select the table with the mouse and copy it instead.';

/** Puts the recipe on the clipboard and says beside the button how that went. */
export function CopyRecipe({ text, label = 'Copy recipe' }: { text(): string; label?: string }) {
  const [said, setSaid] = useState<string>();
  async function copy() {
    try {
      await navigator.clipboard.writeText(text());
      setSaid(DONE);
    } catch {
      setSaid(REFUSED);
    }
  }
  return (
    <span className={styles.copy}>
      <span role="status">{said}</span>
      <Button tone="quiet" icon="copy" onClick={() => void copy()}>
        {label}
      </Button>
    </span>
  );
}
