import { Injectable, type OnModuleInit } from '@nestjs/common';
import { EntityManager } from '@mikro-orm/postgresql';
import { missingMigrations } from '@quarterpoise/database';

/** Refuses to start on a schema that is behind this build: migrating is a step of its own, never a side effect of starting. */
@Injectable()
export class SchemaGate implements OnModuleInit {
  constructor(private readonly em: EntityManager) {}

  async onModuleInit(): Promise<void> {
    const missing = await this.missing();
    if (missing.length > 0) {
      throw new Error(`The database is behind this build; migrate it first. Not applied: ${missing.join(', ')}`);
    }
  }

  missing(): Promise<string[]> {
    return missingMigrations(this.em);
  }
}
