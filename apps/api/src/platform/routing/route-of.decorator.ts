import { applyDecorators, HttpCode, RequestMapping, RequestMethod, SetMetadata } from '@nestjs/common';
import type { RouteDefinition } from '@quarterpoise/dto';
import type { AnswerOf } from '../answers/answers.js';

export const ROUTE = Symbol('route');
export const OPEN_ROUTE = Symbol('open-route');

export const API_PREFIX = '/api/v1';

type Handler<R extends RouteDefinition> = (...parameters: never[]) => AnswerOf<R> | Promise<AnswerOf<R>>;

/**
 * Binds a controller method to its entry in the route table: method, address, access, what it takes and what it answers all come from
 * there. The method's return type has to be what the route promises.
 */
export function RouteOf<const R extends RouteDefinition>(route: R) {
  return <H extends Handler<R>>(target: object, key: string | symbol, descriptor: TypedPropertyDescriptor<H>): void => {
    applyDecorators(
      SetMetadata(ROUTE, route),
      HttpCode(route.status ?? 200),
      RequestMapping({ path: `${API_PREFIX}${route.path}`, method: RequestMethod[route.method] }),
    )(target, key, descriptor as PropertyDescriptor);
  };
}

/** For what stands outside the route table and is open to everybody: the probes of the operator's platform. */
export const OpenRoute = (path: string) =>
  applyDecorators(SetMetadata(OPEN_ROUTE, true), RequestMapping({ path, method: RequestMethod.GET }));
