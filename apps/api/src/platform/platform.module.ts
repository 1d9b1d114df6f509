import { type DynamicModule, Module } from '@nestjs/common';
import { APP_FILTER, APP_GUARD, APP_INTERCEPTOR, DiscoveryModule } from '@nestjs/core';
import { MikroOrmModule } from '@mikro-orm/nestjs';
import { PostgreSqlDriver } from '@mikro-orm/postgresql';
import { ormOptions } from '@quarterpoise/database';
import type { RouteDefinition } from '@quarterpoise/dto';
import { LoggerModule } from 'nestjs-pino';
import { ENVIRONMENT, type Environment } from '../config/env.js';
import { AccessGuard } from './access/access.guard.js';
import { AnswerInterceptor } from './answers/answer.interceptor.js';
import { ProgressStreams } from './answers/progress-streams.js';
import { IdempotencyInterceptor } from './idempotency.interceptor.js';
import { RateLimit } from './limits/rate-limit.js';
import { loggingOptions } from './logging.js';
import { ProblemFilter } from './problems/problem.filter.js';
import { REDIS, redisProvider, RedisShutdown } from './redis.js';
import { InputInterceptor } from './routing/input.interceptor.js';
import { ROUTE_TABLE, RouteTableCheck } from './routing/route-table.check.js';

/** Everything between the wire and the features: access, input, answers, problems, and the connections. Features add nothing here. */
@Module({})
export class PlatformModule {
  static register(environment: Environment, routes: readonly RouteDefinition[]): DynamicModule {
    return {
      module: PlatformModule,
      global: true,
      imports: [
        DiscoveryModule,
        LoggerModule.forRoot(loggingOptions(environment)),
        MikroOrmModule.forRoot({
          ...ormOptions(environment.database.url, { max: environment.database.poolSize }),
          driver: PostgreSqlDriver,
          // each transaction has an EntityManager of its own (withScope), so requests need no shared one
          registerRequestContext: false,
          logger: () => undefined,
        }),
      ],
      providers: [
        { provide: ENVIRONMENT, useValue: environment },
        { provide: ROUTE_TABLE, useValue: routes },
        redisProvider,
        RedisShutdown,
        RouteTableCheck,
        RateLimit,
        ProgressStreams,
        { provide: APP_FILTER, useClass: ProblemFilter },
        { provide: APP_GUARD, useClass: AccessGuard },
        // outermost first: input is checked, then a repeat is recognised, then the handler's answer is put into shape
        { provide: APP_INTERCEPTOR, useClass: InputInterceptor },
        { provide: APP_INTERCEPTOR, useClass: IdempotencyInterceptor },
        { provide: APP_INTERCEPTOR, useClass: AnswerInterceptor },
      ],
      exports: [ENVIRONMENT, ROUTE_TABLE, REDIS, RateLimit, ProgressStreams],
    };
  }
}
