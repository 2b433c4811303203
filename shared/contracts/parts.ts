import { z } from 'zod';
import { codes } from '../marking/scheme';

/** Shapes that several areas share. */

export const uuid = z.uuid();
export const instant = z.int();
export const rev = z.int().min(1);
export const idParams = z.object({ id: uuid });
export const code = z.enum(codes);
export const grains = z.int().min(0);

/** What one person typed: verbatim text or a code, never both. */
export const given = z.union([
  z.strictObject({ text: z.string().min(1).max(64) }),
  z.strictObject({ code }),
]);
