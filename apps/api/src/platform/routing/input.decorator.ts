import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { FastifyRequest } from 'fastify';

/** The checked params, query and body of the request: type the parameter as `InputOf<typeof someRoutes.some>`. */
export const Input = createParamDecorator((_: unknown, context: ExecutionContext) => {
  return context.switchToHttp().getRequest<FastifyRequest>().routeInput;
});
