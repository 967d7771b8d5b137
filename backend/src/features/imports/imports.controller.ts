import { Body, Controller, Delete, Get, HttpCode, HttpStatus, Param, Post, Put, Query, UploadedFile, UseInterceptors } from '@nestjs/common';
import {
  importConfirmSchema, importDtoSchema, importMappingSchema, importPreviewDtoSchema, importPreviewQuerySchema, importResultDtoSchema, message,
} from '@mantlet/common';
import type { ImportConfirm, ImportDto, ImportMapping, ImportPreviewDto, ImportResultDto } from '@mantlet/common';
import { Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { unprocessable } from '../../shared/refusal.js';
import { uploadedName } from '../../shared/uploaded-name.js';
import { idParam } from '../../shared/validation.js';
import { ImportConfirmService } from './import-confirm.service.js';
import { ImportsService } from './imports.service.js';
import type { PreviewQuery } from './imports.service.js';
import { ScheduleFileInterceptor } from './schedule-file.interceptor.js';

/** Member schedules as CSV or XLSX: upload, say what the columns hold, look at every row, confirm. */
@Controller('projects/:projectId/imports')
export class ImportsController {
  constructor(
    private readonly imports: ImportsService,
    private readonly confirming: ImportConfirmService,
  ) {}

  /** multipart, field `file`, at most 10 MB. */
  @Post()
  @Roles('specifier')
  @Returns(importDtoSchema, 'Reads a member schedule from CSV or XLSX, at most 10 MB, field “file”; nothing is written yet.')
  @UseInterceptors(ScheduleFileInterceptor)
  upload(@Scope() scope: ProjectScope, @UploadedFile() file: Express.Multer.File | undefined): Promise<ImportDto> {
    if (!file) throw unprocessable(message('import.no-file', {}));
    return this.imports.upload(scope, uploadedName(file, 'The file'), file.buffer);
  }

  @Get(':importId')
  @Roles('specifier')
  @Returns(importDtoSchema, 'An upload: its sheets, and what was understood of their headers.')
  find(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string): Promise<ImportDto> {
    return this.imports.find(scope, importId);
  }

  @Put(':importId/mapping')
  @Roles('specifier')
  @Returns(importPreviewDtoSchema, 'Says what the columns hold, and gives the first rows as they would be taken.')
  map(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string, @Body({ schema: importMappingSchema }) mapping: ImportMapping): Promise<ImportPreviewDto> {
    return this.imports.map(scope, importId, mapping);
  }

  @Get(':importId/preview')
  @Roles('specifier')
  @Returns(importPreviewDtoSchema, 'The rows of an upload as they would be taken, wrong ones with what is wrong.')
  preview(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string, @Query({ schema: importPreviewQuerySchema }) query: PreviewQuery): Promise<ImportPreviewDto> {
    return this.imports.preview(scope, importId, query);
  }

  @Post(':importId/confirm')
  @HttpCode(HttpStatus.OK)
  @Roles('specifier')
  @Returns(importResultDtoSchema, 'Writes the rows: all of them, or those that are right.')
  confirm(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string, @Body({ schema: importConfirmSchema }) input: ImportConfirm): Promise<ImportResultDto> {
    return this.confirming.confirm(scope, importId, input);
  }

  /** Gives it up; nothing was written, nothing will be. */
  @Delete(':importId')
  @HttpCode(HttpStatus.NO_CONTENT)
  @Roles('specifier')
  @ReturnsNothing('Gives an upload up; nothing was written.')
  abandon(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string): Promise<void> {
    return this.imports.abandon(scope, importId);
  }
}
