import 'reflect-metadata';
import { Controller, Get } from '@nestjs/common';
import { defineRoute, PUBLIC, type RouteDefinition, SIGNED_IN } from '@quarterpoise/dto';
import { describe, expect, it } from 'vitest';
import { OpenRoute, RouteOf } from './route-of.decorator.js';
import { handlersOf, routeTableFaults } from './route-table.check.js';

const one = defineRoute({ id: 'a.one', method: 'GET', path: '/one', access: PUBLIC, summary: 'One', status: 204 });
const two = defineRoute({ id: 'a.two', method: 'GET', path: '/two', access: SIGNED_IN, summary: 'Two', status: 204 });

@Controller()
class Fitting {
  @RouteOf(one)
  one(): void {}

  @RouteOf(two)
  two(): void {}

  @OpenRoute('/api/health/live')
  probe(): void {}

  notARoute(): void {}
}

@Controller()
class Stray {
  @Get('/secret')
  secret(): void {}
}

@Controller()
class Twin {
  @RouteOf(two)
  again(): void {}
}

describe('routeTableFaults', () => {
  it('finds nothing when every entry has one handler', () => {
    expect(routeTableFaults([one, two], handlersOf(Fitting))).toEqual([]);
  });

  it('finds an entry without a handler', () => {
    expect(routeTableFaults([one, two], handlersOf(Twin))).toEqual(['a.one has no handler']);
  });

  it('finds an entry with two handlers', () => {
    expect(routeTableFaults([one, two], [...handlersOf(Fitting), ...handlersOf(Twin)])).toEqual([
      'a.two has several handlers: Fitting.two, Twin.again',
    ]);
  });

  it('finds a handler that is bound to nothing, or to a route outside the table', () => {
    expect(routeTableFaults([], handlersOf(Stray))).toEqual([
      'Stray.secret answers requests but is bound to no route of the table',
    ]);
    expect(routeTableFaults([], handlersOf(Twin))).toEqual(['Twin.again is bound to a.two, which is not in the table']);
  });

  it('finds a route that does not say who may call it', () => {
    const open = { ...one, access: undefined } as unknown as RouteDefinition;
    expect(routeTableFaults([open], [{ name: 'X.open', route: open, isOpen: false }])).toContain(
      'X.open: the route a.one does not say who may call it',
    );
  });

  it('finds two entries at one address', () => {
    const byId = { ...one, id: 'a.by-id', path: '/one/:id' };
    const byName = { ...one, id: 'a.by-name', path: '/one/:name' };
    const handlers = [byId, byName].map((route) => ({ name: route.id, route, isOpen: false }));
    expect(routeTableFaults([byId, byName], handlers)).toEqual(['GET /one/: is in the table twice']);
  });
});
