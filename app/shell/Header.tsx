import { useState } from 'react';
import type { Workbook } from '../../src';
import { IconButton } from '../parts/IconButton';
import { TextField } from '../parts/TextField';
import { useCommands } from '../state/commands';
import type { Imported } from '../state/workbookFile';
import { editWorkbook, useWorkbook } from '../state/workbookStore';
import styles from './Header.module.css';
import { ImportNotice } from './ImportNotice';
import { Mark } from './Mark';
import { Purpose } from './Purpose';
import { SaveNotice } from './SaveNotice';
import { SaveState } from './SaveState';
import { ThemeButton } from './ThemeButton';
import { WorkbookMenu } from './WorkbookMenu';

type ImportShown = Imported & { fileName: string; workbook: Workbook };

/** Whose figures these are, whether they are safe, and the way back. */
export function Header() {
  const name = useWorkbook(({ workbook }) => workbook.name);
  const [imported, setImported] = useState<ImportShown>();
  const invented = useWorkbook(({ workbook }) => workbook.invented);
  // "Undo brings the former workbook back" is true till the next change; a refusal stands till it is put away.
  const importShown = useWorkbook(({ workbook }) => imported && (!imported.ok || imported.workbook === workbook));
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
        <WorkbookMenu onImported={(result) => setImported({ ...result, workbook: useWorkbook.getState().workbook })} />
      </div>
      <Purpose />
      <SaveNotice />
      <ImportNotice result={importShown ? imported : undefined} onHide={() => setImported(undefined)} />
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
