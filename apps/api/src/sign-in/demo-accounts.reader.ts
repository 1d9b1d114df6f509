import { Inject, Injectable } from '@nestjs/common';
import { demoAccounts } from '@quarterpoise/dto';
import { readFile } from 'node:fs/promises';
import type { z } from 'zod';
import { ENVIRONMENT, type Environment } from '../config/env.js';

/** The sign-ins that the seed of the demo has written down; none unless this is a demo. */
@Injectable()
export class DemoAccountsReader {
  constructor(@Inject(ENVIRONMENT) private readonly environment: Environment) {}

  async list(): Promise<z.output<typeof demoAccounts>> {
    const file = this.environment.demo.accountsFile;
    if (file === null) return { items: [] };
    return demoAccounts.parse(JSON.parse(await readFile(file, 'utf8')));
  }
}
