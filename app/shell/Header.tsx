import { useState } from 'react';
import { IconButton } from '../parts/IconButton';
import { TextField } from '../parts/TextField';
import { useCommands } from '../state/commands';
import type { Imported } from '../state/workbookFile';
import { editWorkbook, useWorkbook } from '../state/workbookStore';
import styles from './Header.module.css';
import { ImportNotice } from './ImportNotice';
import { Mark } from './Mark';
import { SaveNotice } from './SaveNotice';
import { SaveState } from './SaveState';
import { ThemeButton } from './ThemeButton';
import { WorkbookMenu } from './WorkbookMenu';

/** Whose figures these are, whether they are safe, and the way back. */
export function Header() {
  const name = useWorkbook(({ workbook }) => workbook.name);
  const [imported, setImported] = useState<Imported & { fileName: string }>();
  const invented = useWorkbook(({ workbook }) => workbook.invented);
  return (
    <header className={styles.header}>
      <h1 className={styles.brand}>
        <Mark />
        Basewright
      </h1>
      <div className={styles.workbook}>
        <TextField
          label="Name of the workbook"
          hideLabel
          className={styles.workbookName}
          controlClassName={styles.nameControl}
          value={name}
          check={(text) => (text.trim() ? undefined : 'A workbook needs a name.')}
          onCommit={(text) =>
            editWorkbook('rename the workbook', (workbook) => {
              workbook.name = text.trim();
            })
          }
        />
        {invented && (
          <span className={styles.invented} title="Plant, prices and figures are made up to show the program">
            invented figures
          </span>
        )}
        <SaveState />
      </div>
      <div className={styles.tools}>
        <UndoButtons />
        <ThemeButton />
        <WorkbookMenu onImported={setImported} />
      </div>
      <SaveNotice />
      <ImportNotice result={imported} onHide={() => setImported(undefined)} />
    </header>
  );
}

function UndoButtons() {
  const { undo, redo } = useCommands();
  const { undoLabel, redoLabel } = useWorkbook();
  return (
    <>
      <IconButton
        icon="undo"
        label={undoLabel ? `Undo: ${undoLabel}` : 'Undo'}
        disabled={!undo.enabled()}
        onClick={() => undo.run()}
      />
      <IconButton
        icon="redo"
        label={redoLabel ? `Do again: ${redoLabel}` : 'Do again'}
        disabled={!redo.enabled()}
        onClick={() => redo.run()}
      />
    </>
  );
}
