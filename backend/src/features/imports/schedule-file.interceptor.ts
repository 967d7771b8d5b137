import { HttpStatus, Injectable, PayloadTooLargeException } from '@nestjs/common';
import type { CallHandler, ExecutionContext, NestInterceptor } from '@nestjs/common';
import { message } from '@mantlet/common';
import { FileInterceptor } from '@nestjs/platform-express';
import type { Observable } from 'rxjs';
import { Refusal } from '../../shared/refusal.js';
import { fileLimits, megabytes } from './reading/limits.js';

const FileReader = FileInterceptor('file', { limits: { fileSize: fileLimits.uploadBytes, files: 1, fields: 10, fieldSize: 10_000 } });

/** Reads the multipart `file` into memory, and says in words where it is too large. */
@Injectable()
export class ScheduleFileInterceptor extends FileReader implements NestInterceptor {
  override async intercept(context: ExecutionContext, next: CallHandler): Promise<Observable<unknown>> {
    try {
      return await super.intercept(context, next);
    } catch (error) {
      if (!(error instanceof PayloadTooLargeException)) throw error;
      throw new Refusal(HttpStatus.PAYLOAD_TOO_LARGE, message('import.too-large', { limitMb: megabytes(fileLimits.uploadBytes) }));
    }
  }
}
