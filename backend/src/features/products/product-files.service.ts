import { Injectable, StreamableFile } from '@nestjs/common';
import { message } from '@mantlet/common';
import type { ProductDto, ReadTable, ReadTableDto } from '@mantlet/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource, IsNull } from 'typeorm';
import { sha256 } from '../../shared/canonical-json.js';
import { Refusal, notFound } from '../../shared/refusal.js';
import { readSchedule } from '../imports/file-reading.service.js';
import { contentTypeOf, evidenceFileName, requireUpload } from './evidence-file.js';
import { toProductDto } from './product-mapping.js';
import { Product } from './product.entity.js';
import { ProductsService } from './products.service.js';
import type { ProductOwner } from './products.service.js';
import { readThicknessTable } from './read-thickness-table.js';

/** Files that come with products: the report that the data stand in, kept as it came, and tables read from sheets. */
@Injectable()
export class ProductFilesService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly products: ProductsService,
  ) {}

  /** Keeps the file beside the product, with its digest; one that was there before gives way. */
  async store(owner: ProductOwner, productId: string, file: Express.Multer.File | undefined): Promise<ProductDto> {
    const upload = requireUpload(file);
    const name = await evidenceFileName(upload);
    const digest = sha256(upload.content);
    return this.dataSource.transaction(async (manager) => {
      const product = await this.products.lock(manager, owner, productId, 'for_no_key_update');
      const before = product.evidenceFileName && `${product.evidenceFileName} (SHA-256 ${product.evidenceFileSha256 ?? ''})`;
      // the version stays: what somebody may be editing is not touched
      await manager
        .createQueryBuilder()
        .update(Product)
        .set({ evidenceFile: upload.content, evidenceFileName: name, evidenceFileSha256: digest, evidenceFileBytes: upload.content.length, version: () => 'version' })
        .where('id = :productId', { productId })
        .execute();
      await this.products.record(manager, owner, 'evidence file stored', product, [{ field: 'evidenceFile', old: before || null, new: `${name} (SHA-256 ${digest})` }]);
      return toProductDto(await manager.findOneByOrFail(Product, { id: productId }));
    });
  }

  /** As it was uploaded. 404 with a sentence where there is none. */
  async fetch(projectId: string | null, productId: string): Promise<StreamableFile> {
    const where = [{ id: productId, projectId: IsNull() }, ...(projectId ? [{ id: productId, projectId }] : [])];
    const product = await this.dataSource.manager.findOne(Product, { where, select: { id: true, name: true, evidenceFileName: true, evidenceFile: true } });
    if (!product) throw notFound('product');
    if (!product.evidenceFile || !product.evidenceFileName) throw new Refusal(404, message('product.no-evidence-file', { product: product.name }));
    const name = product.evidenceFileName;
    const plain = name.replace(/[^\x20-\x7e]|["\\]/g, '_');
    return new StreamableFile(product.evidenceFile, {
      type: contentTypeOf(name), length: product.evidenceFile.length,
      disposition: `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(name).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`)}`,
    });
  }

  /** Reads, and stores nothing. */
  async readTable(file: Express.Multer.File | undefined, options: ReadTable): Promise<ReadTableDto> {
    const { name, content } = requireUpload(file);
    const { sheets } = await readSchedule(name, content);
    return readThicknessTable(name, sheets[0] ?? { name, rows: [] }, options);
  }
}
