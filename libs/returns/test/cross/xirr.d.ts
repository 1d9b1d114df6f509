/** The package comes without types. */
declare module 'xirr' {
  function xirr(transactions: readonly { amount: number; when: Date }[], options?: { guess?: number }): number;
  export = xirr;
}
