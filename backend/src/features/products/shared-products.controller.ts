import { Body, Controller, Delete, Get, HttpCode, Param, Post, Put, StreamableFile, UploadedFile, UseInterceptors } from '@nestjs/common';
import { productDtoSchema, productInputSchema, productSummaryDtoSchema, productUpdateSchema, readTableDtoSchema, readTableSchema } from '@mantlet/common';
import type { ProductDto, ProductInput, ProductSummaryDto, ProductUpdate, ReadTable, ReadTableDto } from '@mantlet/common';
import { FileInterceptor } from '@nestjs/platform-express';
import { z } from 'zod';
import { AdministratorOnly, CurrentActor, SignedIn } from '../../shared/access.js';
import type { Actor } from '../../shared/access.js';
import { Returns, ReturnsFile, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { uploadLimits } from './evidence-file.js';
import { ProductFilesService } from './product-files.service.js';
import { withoutRates } from './product-mapping.js';
import { ProductsService } from './products.service.js';

/** The shared library: the administrator keeps it, everybody reads it; the rates only the administrator, others on the projects they design. */
@Controller('products')
export class SharedProductsController {
  constructor(
    private readonly products: ProductsService,
    private readonly files: ProductFilesService,
  ) {}

  @Get()
  @SignedIn()
  @Returns(z.array(productSummaryDtoSchema), 'The shared library; rates for the administrator only.')
  async list(@CurrentActor() actor: Actor): Promise<ProductSummaryDto[]> {
    const products = await this.products.list(null);
    return actor.administrator ? products : products.map(withoutRates);
  }

  @Get(':productId')
  @SignedIn()
  @Returns(productDtoSchema, 'One product with its evidence; thickness in µm for coatings, in mm for boards and sprays.')
  async get(@CurrentActor() actor: Actor, @Param('productId', idParam) productId: string): Promise<ProductDto> {
    const product = await this.products.get(null, productId);
    return actor.administrator ? product : withoutRates(product);
  }

  @Post()
  @AdministratorOnly()
  @Returns(productDtoSchema, 'Adds a product.')
  create(@CurrentActor() actor: Actor, @Body({ schema: productInputSchema }) input: ProductInput): Promise<ProductDto> {
    return this.products.create({ projectId: null, actor }, input);
  }

  @Post('read-table')
  @HttpCode(200)
  @AdministratorOnly()
  @Returns(readTableDtoSchema, 'Reads one thickness table from CSV or XLSX, field “file”; nothing is stored.')
  @UseInterceptors(FileInterceptor('file', uploadLimits))
  readTable(@UploadedFile() file: Express.Multer.File | undefined, @Body({ schema: readTableSchema }) options: ReadTable): Promise<ReadTableDto> {
    return this.files.readTable(file, options);
  }

  @Put(':productId')
  @AdministratorOnly()
  @Returns(productDtoSchema, 'Changes a product; members that use it are assessed anew.')
  update(@CurrentActor() actor: Actor, @Param('productId', idParam) productId: string, @Body({ schema: productUpdateSchema }) input: ProductUpdate): Promise<ProductDto> {
    return this.products.update({ projectId: null, actor }, productId, input);
  }

  @Delete(':productId')
  @HttpCode(204)
  @AdministratorOnly()
  @ReturnsNothing('Removes a product that no zone uses.')
  remove(@CurrentActor() actor: Actor, @Param('productId', idParam) productId: string): Promise<void> {
    return this.products.remove({ projectId: null, actor }, productId);
  }

  /** PDF, CSV or XLSX up to 10 MB. */
  @Put(':productId/evidence-file')
  @AdministratorOnly()
  @Returns(productDtoSchema, 'Stores the evidence file: PDF, CSV or XLSX up to 10 MB, field “file”.')
  @UseInterceptors(FileInterceptor('file', uploadLimits))
  storeFile(@CurrentActor() actor: Actor, @Param('productId', idParam) productId: string, @UploadedFile() file: Express.Multer.File | undefined): Promise<ProductDto> {
    return this.files.store({ projectId: null, actor }, productId, file);
  }

  @Get(':productId/evidence-file')
  @SignedIn()
  @ReturnsFile('application/octet-stream', 'The evidence file.')
  fetchFile(@Param('productId', idParam) productId: string): Promise<StreamableFile> {
    return this.files.fetch(null, productId);
  }
}
