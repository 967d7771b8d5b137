import { Module } from '@nestjs/common';
import { AssessmentModule } from '../assessment/assessment.module.js';
import { QuantitiesController } from './quantities.controller.js';
import { QuantitiesService } from './quantities.service.js';

@Module({ imports: [AssessmentModule], controllers: [QuantitiesController], providers: [QuantitiesService], exports: [QuantitiesService] })
export class QuantitiesModule {}
