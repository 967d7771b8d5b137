import { z } from 'zod';
import type { Message } from '../errors/message.js';

/** A reason by its code and what fills its sentence. Codes are not listed: an older record may hold one that is no longer said. */
export const messageSchema = z.object({ code: z.string(), params: z.record(z.string(), z.unknown()) }) as unknown as z.ZodType<Message>;
