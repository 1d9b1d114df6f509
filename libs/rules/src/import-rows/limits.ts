/** Longest values in characters; what is longer is nearly always two values run together. */
export const LONGEST = {
  reference: 80,
  participantNumber: 40,
  name: 100,
  email: 254,
  /** Codes of funds and sources. */
  code: 60,
  deliveryBasis: 200,
  addressLine: 120,
} as const;
