import { BadRequestException, StandardSchemaValidationPipe } from '@nestjs/common';
import type { ArgumentMetadata } from '@nestjs/common';
import { z } from 'zod';
import { speakInWords } from './input-words.js';
import { unstorable } from './storable.js';

/** What fits its contract must also be text that can be kept and read again as it was sent. */
class InputPipe extends StandardSchemaValidationPipe {
  override async transform<T>(value: T, metadata: ArgumentMetadata): Promise<T> {
    const taken = await super.transform(value, metadata);
    const path = metadata.schema ? unstorable(taken) : null;
    if (path) throw this.exceptionFactory([{ path, message: 'holds a character that cannot be stored' }]);
    return taken;
  }
}

/** Answers 400 with one sentence and the fields at fault, in the words of the schema. */
export function validationPipe(): StandardSchemaValidationPipe {
  speakInWords();
  return new InputPipe({
    exceptionFactory: (found) => {
      const issues = found.slice(0, 50).map((issue) => ({
        path: (issue.path ?? []).map((part) => String(typeof part === 'object' ? part.key : part)).join('.'),
        message: issue.message,
      }));
      const first = issues[0];
      const where = `${first?.path || 'Input'}: `;
      return new BadRequestException({ message: `Not saved. ${where}${first?.message ?? 'the input is not valid'}`, code: 'shared.invalid', issues });
    },
  });
}

/** For @Param: an identifier in the path. */
export const idParam = { schema: z.uuid() };
