import 'reflect-metadata';
import { expect, it } from 'vitest';

class Engine {}

function injectable(target: new (engine: Engine) => object): void {
  void target;
}

@injectable
class Car {
  constructor(readonly engine: Engine) {}
}

it('leaves the types of constructor parameters behind, which injection rests on', () => {
  expect(Reflect.getMetadata('design:paramtypes', Car)).toEqual([Engine]);
});
