import { z } from 'zod';

/** One sign-in, one hat at a time: the role in which a person is acting just now. */
export const HATS = ['administrator', 'approver', 'participant', 'support', 'auditor', 'operator'] as const;
export const hat = z.enum(HATS);
export type Hat = z.infer<typeof hat>;
