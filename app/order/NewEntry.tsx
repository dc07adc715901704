import { useState } from 'react';
import { TextField } from '../parts/TextField';

/** A field that adds what is typed to a list and is then empty again. */
export function NewEntry({
  label,
  placeholder,
  taken,
  onAdd,
}: {
  label: string;
  placeholder: string;
  taken: readonly string[];
  onAdd(text: string): void;
}) {
  const [count, setCount] = useState(0);
  return (
    <TextField
      key={count}
      label={label}
      hideLabel
      placeholder={placeholder}
      value=""
      check={(text) => (taken.includes(text.trim()) ? `“${text.trim()}” is in the list already.` : undefined)}
      onCommit={(text) => {
        if (text.trim() === '') return;
        onAdd(text.trim());
        setCount(count + 1);
      }}
    />
  );
}
