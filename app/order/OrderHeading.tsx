import type { WorkbookOrder } from '../../src';
import { TextField } from '../parts/TextField';
import styles from './OrderEditor.module.css';
import { editOrder } from './useOrder';

/** Name and note of the order, edited where they stand. */
export function OrderHeading({ order }: { order: WorkbookOrder }) {
  return (
    <div className={styles.heading}>
      <h2 className="visually-hidden">{`Order: ${order.name}`}</h2>
      <TextField
        controlClassName={styles.nameControl}
        label="Name of the order"
        hideLabel
        wrap
        value={order.name}
        check={(text) => (text.trim() ? undefined : 'An order needs a name.')}
        onCommit={(name) =>
          editOrder(order.id, 'rename the order', (draft) => {
            draft.name = name.trim();
          })
        }
      />
      <TextField
        label="Note"
        hideLabel
        rows={1}
        placeholder="Add a note"
        controlClassName={styles.noteControl}
        value={order.note ?? ''}
        onCommit={(note) =>
          editOrder(order.id, 'change the note', (draft) => {
            if (note.trim()) draft.note = note;
            else delete draft.note;
          })
        }
      />
    </div>
  );
}
