import { Module } from '@nestjs/common';
import { EventStreamsService } from './event-streams.service.js';
import { EventsController } from './events.controller.js';

@Module({ controllers: [EventsController], providers: [EventStreamsService] })
export class EventsModule {}
