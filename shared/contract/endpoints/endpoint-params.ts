import { z } from 'zod';
import { idSchema } from '../numbers.ts';

/** No parameters in the path, or no fields in the body or the answer. */
export const nothing = z.object({});
export const byId = z.object({ id: idSchema });
