import { Inject, Injectable, type OnModuleInit } from '@nestjs/common';
import { DiscoveryService, MetadataScanner } from '@nestjs/core';
import { PATH_METADATA } from '@nestjs/common/constants.js';
import type { RouteDefinition } from '@quarterpoise/dto';
import { OPEN_ROUTE, ROUTE } from './route-of.decorator.js';

/** Token of the list of routes that this process has to serve. */
export const ROUTE_TABLE = Symbol('route-table');

export interface BoundHandler {
  /** `ImportsController.upload`, for messages. */
  readonly name: string;
  readonly route: RouteDefinition | undefined;
  readonly isOpen: boolean;
}

/**
 * What is wrong between the table and the controllers: an entry without a handler, with two, or a handler outside the table.
 * Empty when they fit.
 */
export function routeTableFaults(table: readonly RouteDefinition[], handlers: readonly BoundHandler[]): string[] {
  const faults: string[] = [];
  const byRoute = new Map<RouteDefinition, string[]>(table.map((route) => [route, []]));
  for (const { name, route, isOpen } of handlers) {
    if (isOpen) continue;
    if (!route) faults.push(`${name} answers requests but is bound to no route of the table`);
    else if (!route.access) faults.push(`${name}: the route ${route.id} does not say who may call it`);
    else if (!byRoute.has(route)) faults.push(`${name} is bound to ${route.id}, which is not in the table`);
    else byRoute.get(route)!.push(name);
  }
  for (const [route, names] of byRoute) {
    if (names.length === 0) faults.push(`${route.id} has no handler`);
    if (names.length > 1) faults.push(`${route.id} has several handlers: ${names.join(', ')}`);
  }
  const seen = new Set<string>();
  for (const { id, method, path } of table) {
    const address = `${method} ${path.replace(/:\w+/g, ':')}`;
    for (const key of [id, address]) {
      if (seen.has(key)) faults.push(`${key} is in the table twice`);
      seen.add(key);
    }
  }
  return faults;
}

/** Refuses to start while table and controllers do not fit, so that no route can be open by oversight. */
@Injectable()
export class RouteTableCheck implements OnModuleInit {
  constructor(
    private readonly discovery: DiscoveryService,
    @Inject(ROUTE_TABLE) private readonly table: readonly RouteDefinition[],
  ) {}

  onModuleInit(): void {
    const faults = routeTableFaults(this.table, this.handlers());
    if (faults.length > 0) throw new Error(`The API does not fit its route table:\n  ${faults.join('\n  ')}`);
  }

  private handlers(): BoundHandler[] {
    return this.discovery
      .getControllers()
      .flatMap(({ metatype }) => (typeof metatype === 'function' ? handlersOf(metatype) : []));
  }
}

/** The methods of a controller class that answer requests. */
export function handlersOf(controller: { name: string; prototype: object }): BoundHandler[] {
  return new MetadataScanner().getAllMethodNames(controller.prototype).flatMap((method) => {
    const handler = (controller.prototype as Record<string, object>)[method]!;
    if (!Reflect.hasMetadata(PATH_METADATA, handler)) return [];
    return {
      name: `${controller.name}.${method}`,
      route: Reflect.getMetadata(ROUTE, handler) as RouteDefinition | undefined,
      isOpen: Reflect.getMetadata(OPEN_ROUTE, handler) === true,
    };
  });
}
