/** 19200 of "gbp" as £192.00; the amount is in the currency's smallest unit. */
export const formatMoney = (amountMinor: number, currency: string): string =>
  new Intl.NumberFormat("en-GB", { style: "currency", currency: currency.toUpperCase() }).format(amountMinor / 100);
