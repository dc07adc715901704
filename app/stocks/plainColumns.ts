import { FAMILIES } from '../../src';
import type { Column } from './column';
import { chooseFamily, readFamily } from './readFamily';

export const NAME_COLUMN: Column = {
  id: 'name',
  label: 'Stock',
  title: 'Name of the stock',
  kind: 'text',
  read: ({ name }) =>
    name.trim() === ''
      ? { text: '', edit: '', problem: 'A stock needs a name, or nobody can tell it from the others.' }
      : { text: name, edit: name },
  write(product, text) {
    product.name = text.trim();
  },
};

export const SUPPLIER_COLUMN: Column = {
  id: 'supplier',
  label: 'Supplier',
  title: 'Supplier',
  kind: 'text',
  read: ({ supplier = '' }) => ({ text: supplier, edit: supplier }),
  write(product, text) {
    if (text.trim()) product.supplier = text.trim();
    else delete product.supplier;
  },
};

export const FAMILY_COLUMN: Column = {
  id: 'family',
  label: 'Family',
  title: 'Family: API group or kind of stock',
  kind: 'choice',
  choices: FAMILIES,
  choose: chooseFamily,
  read: ({ family }) => ({ text: family, edit: family }),
  write(product, text) {
    product.family = readFamily(text) ?? 'other';
  },
};

export const FLAGS_COLUMN: Column = {
  id: 'flags',
  label: 'Flags',
  title: 'Flags such as “food contact” or “no zinc”, with commas between them',
  kind: 'text',
  read({ flags = [] }) {
    const text = flags.join(', ');
    return { text, edit: text };
  },
  write(product, text) {
    const flags = [...new Set(text.split(/[,;]/).map((flag) => flag.trim()))].filter(Boolean);
    if (flags.length > 0) product.flags = flags;
    else delete product.flags;
  },
};
