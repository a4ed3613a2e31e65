/**
 * The fee of one sitting, its decision and, if it is competent, its certificate. The same whatever the outcome.
 * `amountMinor` is in the currency's smallest unit (pence). The amount is the installation's own choice:
 * no source.
 */
export const SITTING_FEE = { amountMinor: 19200, currency: "gbp" } as const;
