import { Module } from '@nestjs/common';
import { QuantitiesService } from './quantities.service.js';

@Module({ providers: [QuantitiesService], exports: [QuantitiesService] })
export class QuantitiesModule {}
