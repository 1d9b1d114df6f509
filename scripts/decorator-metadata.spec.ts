import { expect, it } from 'vitest';

class Engine {}

it('compiles decorators so that the types of constructor parameters are left behind, which injection rests on', () => {
  const left = new Map<string, unknown>();
  // what reflect-metadata provides in the product, as far as the compiler's output calls it
  Object.assign(Reflect, { metadata: (key: string, value: unknown) => () => void left.set(key, value) });
  const injectable = (target: new (engine: Engine) => object) => void target;

  @injectable
  class Car {
    constructor(readonly engine: Engine) {}
  }

  expect(new Car(new Engine()).engine).toBeInstanceOf(Engine);
  expect(left.get('design:paramtypes')).toEqual([Engine]);
});
