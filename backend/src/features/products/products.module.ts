import { Module } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { AssessmentModule } from '../assessment/assessment.module.js';
import { AuditModule } from '../audit/audit.module.js';
import { ProductFilesService } from './product-files.service.js';
import { Product } from './product.entity.js';
import { ProductsService } from './products.service.js';
import { ProjectProductsController } from './project-products.controller.js';
import { SharedProductsController } from './shared-products.controller.js';

@Module({
  imports: [TypeOrmModule.forFeature([Product]), AssessmentModule, AuditModule],
  controllers: [SharedProductsController, ProjectProductsController],
  providers: [ProductsService, ProductFilesService],
  exports: [ProductsService],
})
export class ProductsModule {}
