import { type DynamicModule, Module, type Type } from '@nestjs/common';
import { type RouteDefinition, ROUTES } from '@quarterpoise/dto';
import type { Environment } from './config/env.js';
import { OperationsModule } from './operations/operations.module.js';
import { PlatformModule } from './platform/platform.module.js';
import { SignInModule } from './sign-in/sign-in.module.js';

/** The feature modules, one per folder. */
export const FEATURES: readonly Type[] = [SignInModule];

/** What a process serves: the modules with their controllers, and the routes that these have to cover, no more and no fewer. */
export interface Composition {
  readonly features: readonly Type[];
  readonly routes: readonly RouteDefinition[];
}

export const WHOLE_API: Composition = { features: FEATURES, routes: ROUTES };

@Module({})
export class ApiModule {
  static register(environment: Environment, { features, routes }: Composition): DynamicModule {
    return {
      module: ApiModule,
      imports: [PlatformModule.register(environment, routes), OperationsModule, ...features],
    };
  }
}
