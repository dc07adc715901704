import type { ShareBasis } from '../../src';
import { Select } from '../parts/Select';

/** Of the mix, or of the base oil alone (everything but thickeners, packages and depressants). */
export function BasisSelect({
  label,
  value,
  onChange,
}: {
  label: string;
  value: ShareBasis | undefined;
  onChange(basis: ShareBasis): void;
}) {
  return (
    <Select
      label={label}
      hideLabel
      value={value ?? 'mix'}
      options={[
        { value: 'mix', label: 'of the mix' },
        { value: 'base oil', label: 'of the base oil' },
      ]}
      onChange={onChange}
    />
  );
}
