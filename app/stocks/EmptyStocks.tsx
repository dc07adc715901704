import { type ClipboardEvent, useId } from 'react';
import { Button } from '../parts/Button';
import { useCommands } from '../state/commands';
import styles from './EmptyStocks.module.css';

/** What stands where the stocks will be: a place to paste into, and the other ways to begin. */
export function EmptyStocks({ onPaste, onAdd }: { onPaste(text: string): void; onAdd(): void }) {
  const { openDemo } = useCommands();
  const id = useId();
  function takePaste(event: ClipboardEvent) {
    event.preventDefault();
    // The table hears pastes too; this one is taken.
    event.stopPropagation();
    onPaste(event.clipboardData.getData('text/plain'));
  }
  return (
    <div className={styles.empty}>
      <p>There are no stocks yet. Copy them from a spreadsheet, with their headings, and paste them here:</p>
      <textarea
        className={styles.place}
        aria-label="Paste stocks here"
        aria-describedby={id}
        rows={3}
        placeholder={'Name\tFamily\tPrice\tDensity\tKV40\tKV100\tNoack\tPour\tFlash'.replaceAll('\t', '   ')}
        value=""
        onChange={(event) => event.target.value.trim() && onPaste(event.target.value)}
        onPaste={takePaste}
      />
      <p id={id} className={styles.hint}>
        Prices per tonne, viscosities in mm²/s, density at 15 °C in kg/m³, temperatures in °C, sulphur in mg/kg. A cell
        left empty is unknown, never zero.
      </p>
      <p className={styles.ways}>
        <Button icon="add" onClick={onAdd}>
          Add a stock by hand
        </Button>
        <Button icon="book" onClick={() => openDemo.run()}>
          {openDemo.label}
        </Button>
      </p>
    </div>
  );
}
