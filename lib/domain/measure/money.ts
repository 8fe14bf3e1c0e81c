export interface Money {
  /** Whole minor units: cents, pence. */
  minor: number;
  /** ISO 4217 code. */
  currency: string;
}

/**
 * Sum of amounts in one currency.
 *
 * @throws RangeError when currencies differ, naming both, or when the sum leaves the safe integers
 */
export function addMoney(amounts: readonly Money[], currency: string): Money {
  let minor = 0;
  for (const amount of amounts) {
    if (amount.currency !== currency)
      throw new RangeError(`currency: ${amount.currency} cannot be added to ${currency}`);
    minor += amount.minor;
  }
  if (!Number.isSafeInteger(minor)) throw new RangeError(`minor: ${minor} is not a whole number of minor units`);
  return { minor, currency };
}

/** Words for an amount in a person's language, with the currency's own number of decimals (ISO 4217, by Intl). */
export function formatMoney({ minor, currency }: Money, locale: string): string {
  const format = new Intl.NumberFormat(locale, { style: 'currency', currency });
  const decimals = format.resolvedOptions().maximumFractionDigits ?? 2;
  return format.format(minor / 10 ** decimals);
}
