import { z } from 'zod';

/** Cursor pagination: `cursor` is opaque and comes from the page before. */
export const pageQuery = z.object({
  cursor: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});

export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });

export const idParams = z.object({ id: z.uuid() });
export const planParams = z.object({ planId: z.uuid() });
