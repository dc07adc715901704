import { type ChangeEvent, useRef, useState } from 'react';
import { keysInWords } from '../parts/keysInWords';
import { Menu, MenuItem } from '../parts/Menu';
import { type Command, useCommands } from '../state/commands';
import type { Imported } from '../state/workbookFile';
import { OtherWorkbooks } from './OtherWorkbooks';

/** What is done with the workbook as a whole. Nothing here is final: opening another one can be undone. */
export function WorkbookMenu({ onImported }: { onImported(result: Imported & { fileName: string }): void }) {
  const commands = useCommands();
  const file = useRef<HTMLInputElement>(null);
  const [others, setOthers] = useState(false);

  async function importChosen(event: ChangeEvent<HTMLInputElement>) {
    const input = event.currentTarget;
    const [chosen] = input.files ?? [];
    // Emptied, so that the same file can be chosen again after it was mended.
    if (!chosen) return;
    const result = await commands.importWorkbook.run(chosen);
    input.value = '';
    onImported({ ...result, fileName: chosen.name });
  }

  return (
    <>
      <Menu label="Workbook" icon="book">
        <CommandItem command={commands.newEmptyWorkbook} />
        <CommandItem command={commands.openDemo} />
        <MenuItem onSelect={() => file.current?.click()}>Import a workbook file …</MenuItem>
        <CommandItem command={commands.exportWorkbook} />
        <MenuItem onSelect={() => setOthers(true)}>Other workbooks and earlier states …</MenuItem>
        {commands.exportSetAside.enabled() && <CommandItem command={commands.exportSetAside} />}
      </Menu>
      <OtherWorkbooks open={others} onClose={() => setOthers(false)} />
      <input
        ref={file}
        type="file"
        accept=".json,application/json"
        aria-label="Workbook file to import"
        hidden
        onChange={importChosen}
      />
    </>
  );
}

function CommandItem({ command }: { command: Command }) {
  return (
    <MenuItem keys={keysInWords(command.keys)} disabled={!command.enabled()} onSelect={() => command.run()}>
      {command.label}
    </MenuItem>
  );
}
