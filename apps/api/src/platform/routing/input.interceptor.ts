import { type CallHandler, type ExecutionContext, Injectable, type NestInterceptor } from '@nestjs/common';
import type { ProblemError, RouteDefinition } from '@quarterpoise/dto';
import type { FastifyRequest } from 'fastify';
import { finalize, type Observable } from 'rxjs';
import type { z } from 'zod';
import { inputFaults } from '../problems/input-faults.js';
import { ProblemException } from '../problems/problem.exception.js';
import { ROUTE } from './route-of.decorator.js';
import type { RouteInput } from './route-input.js';
import { discardUpload, readUpload } from './upload.js';

/** Checks params, query and body by the schemas of the route before the handler runs; all faults are told at once. */
@Injectable()
export class InputInterceptor implements NestInterceptor {
  async intercept(context: ExecutionContext, next: CallHandler): Promise<Observable<unknown>> {
    const route = Reflect.getMetadata(ROUTE, context.getHandler()) as RouteDefinition | undefined;
    if (!route) return next.handle();
    const request = context.switchToHttp().getRequest<FastifyRequest>();
    if (route.consumes !== 'multipart') {
      request.routeInput = checkInput(route, request.params, request.query, request.body ?? {});
      return next.handle();
    }
    const { fields, file } = await readUpload(request);
    try {
      request.routeInput = { ...checkInput(route, request.params, request.query, fields), file };
    } catch (error) {
      discardUpload(file);
      throw error;
    }
    return next.handle().pipe(finalize(() => discardUpload(file)));
  }
}

/** @throws ProblemException validation-failed with every fault of the three parts. */
export function checkInput(route: RouteDefinition, params: unknown, query: unknown, body: unknown): RouteInput {
  const errors: ProblemError[] = [];
  const check = (schema: z.ZodType | undefined, value: unknown, prefix: Parameters<typeof inputFaults>[1]) => {
    if (!schema) return undefined;
    const parsed = schema.safeParse(value);
    if (parsed.success) return parsed.data;
    errors.push(...inputFaults(parsed.error, prefix));
    return undefined;
  };
  const input = {
    params: check(route.params, params, '/params'),
    query: check(route.query, query, '/query'),
    body: check(route.body, body, ''),
  };
  if (errors.length > 0) throw new ProblemException('validation-failed', undefined, { errors });
  return input;
}
