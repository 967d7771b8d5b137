import { Body, Controller, Delete, Get, HttpCode, Param, Post, Put, StreamableFile, UploadedFile, UseInterceptors } from '@nestjs/common';
import { productDtoSchema, productInputSchema, productSummaryDtoSchema, productUpdateSchema, readTableDtoSchema, readTableSchema } from '@mantlet/common';
import type { ProductDto, ProductInput, ProductSummaryDto, ProductUpdate, ReadTable, ReadTableDto } from '@mantlet/common';
import { FileInterceptor } from '@nestjs/platform-express';
import { z } from 'zod';
import { DesignTeam, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsFile, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { uploadLimits } from './evidence-file.js';
import { ProductFilesService } from './product-files.service.js';
import { ProductsService } from './products.service.js';

/** What a project may choose from: the shared library and its own products, which the specifier keeps. */
@Controller('projects/:projectId/products')
export class ProjectProductsController {
  constructor(
    private readonly products: ProductsService,
    private readonly files: ProductFilesService,
  ) {}

  @Get()
  @DesignTeam()
  @Returns(z.array(productSummaryDtoSchema), 'Products the project may choose from: the shared library and its own.')
  list(@Scope() scope: ProjectScope): Promise<ProductSummaryDto[]> {
    return this.products.list(scope.projectId);
  }

  @Get(':productId')
  @DesignTeam()
  @Returns(productDtoSchema, 'One product with its evidence; thickness in µm for coatings, in mm for boards and sprays.')
  get(@Scope() scope: ProjectScope, @Param('productId', idParam) productId: string): Promise<ProductDto> {
    return this.products.get(scope.projectId, productId);
  }

  @Post()
  @Roles('specifier')
  @Returns(productDtoSchema, 'Adds a product.')
  create(@Scope() scope: ProjectScope, @Body({ schema: productInputSchema }) input: ProductInput): Promise<ProductDto> {
    return this.products.create(scope, input);
  }

  @Post('read-table')
  @HttpCode(200)
  @Roles('specifier')
  @Returns(readTableDtoSchema, 'Reads one thickness table from CSV or XLSX, field “file”; nothing is stored.')
  @UseInterceptors(FileInterceptor('file', uploadLimits))
  readTable(@UploadedFile() file: Express.Multer.File | undefined, @Body({ schema: readTableSchema }) options: ReadTable): Promise<ReadTableDto> {
    return this.files.readTable(file, options);
  }

  @Put(':productId')
  @Roles('specifier')
  @Returns(productDtoSchema, 'Changes a product; members that use it are assessed anew.')
  update(@Scope() scope: ProjectScope, @Param('productId', idParam) productId: string, @Body({ schema: productUpdateSchema }) input: ProductUpdate): Promise<ProductDto> {
    return this.products.update(scope, productId, input);
  }

  @Delete(':productId')
  @HttpCode(204)
  @Roles('specifier')
  @ReturnsNothing('Removes a product that no zone uses.')
  remove(@Scope() scope: ProjectScope, @Param('productId', idParam) productId: string): Promise<void> {
    return this.products.remove(scope, productId);
  }

  /** PDF, CSV or XLSX up to 10 MB. */
  @Put(':productId/evidence-file')
  @Roles('specifier')
  @Returns(productDtoSchema, 'Stores the evidence file: PDF, CSV or XLSX up to 10 MB, field “file”.')
  @UseInterceptors(FileInterceptor('file', uploadLimits))
  storeFile(@Scope() scope: ProjectScope, @Param('productId', idParam) productId: string, @UploadedFile() file: Express.Multer.File | undefined): Promise<ProductDto> {
    return this.files.store(scope, productId, file);
  }

  @Get(':productId/evidence-file')
  @DesignTeam()
  @ReturnsFile('application/octet-stream', 'The evidence file.')
  fetchFile(@Scope() scope: ProjectScope, @Param('productId', idParam) productId: string): Promise<StreamableFile> {
    return this.files.fetch(scope.projectId, productId);
  }
}
