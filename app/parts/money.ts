const formats = new Map<string, (amount: number) => string>();

/** Making a format costs a hundred times its use, and amounts are drawn anew on every frame of a drag. */
function moneyFormat(currency: string, digits: number): (amount: number) => string {
  const options = { minimumFractionDigits: digits, maximumFractionDigits: digits };
  try {
    const format = new Intl.NumberFormat(undefined, { style: 'currency', currency, ...options });
    return (amount) => format.format(amount);
  } catch (error) {
    // A workbook may carry a code that is none of ISO 4217: it is then written as it stands.
    if (!(error instanceof RangeError)) throw error;
    const format = new Intl.NumberFormat(undefined, options);
    return (amount) => `${format.format(amount)} ${currency}`;
  }
}

/** Amounts in the workbook's currency, with the user's own decimal sign. */
export function formatMoney(amount: number, currency: string, digits = 2): string {
  const key = `${digits} ${currency}`;
  const format = formats.get(key) ?? moneyFormat(currency, digits);
  formats.set(key, format);
  return format(amount);
}
