/** Amounts in the workbook's currency, with the user's own decimal sign. */
export function formatMoney(amount: number, currency: string, digits = 2): string {
  const options = { minimumFractionDigits: digits, maximumFractionDigits: digits };
  try {
    return new Intl.NumberFormat(undefined, { style: 'currency', currency, ...options }).format(amount);
  } catch (error) {
    // A workbook may carry a code that is none of ISO 4217: it is then written as it stands.
    if (error instanceof RangeError) return `${new Intl.NumberFormat(undefined, options).format(amount)} ${currency}`;
    throw error;
  }
}
