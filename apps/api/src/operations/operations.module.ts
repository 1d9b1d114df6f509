import { Module } from '@nestjs/common';
import { HealthController } from './health.controller.js';
import { MetricsService } from './metrics.service.js';
import { SchemaGate } from './schema.gate.js';

@Module({ controllers: [HealthController], providers: [MetricsService, SchemaGate] })
export class OperationsModule {}
