import * as dto from '@quarterpoise/dto';
import * as returns from '@quarterpoise/returns';
import { expect, expectTypeOf, it } from 'vitest';

// libs/returns imports nothing of ours and states its shapes again; here both are held together

it('what is computed fits what is kept and sent', () => {
  expectTypeOf<returns.AccountResult['data']>().toExtend<dto.ResultData>();
  expectTypeOf<dto.ResultData>().toExtend<returns.ResultData>();
  expectTypeOf<returns.Movements>().toEqualTypeOf<dto.Movements>();
  expectTypeOf<returns.ResultWindow>().toEqualTypeOf<dto.ResultWindow>();
  expectTypeOf<returns.Answer>().toExtend<dto.Answer>();
  expectTypeOf<returns.AccountResult['status']>().toEqualTypeOf<dto.ResultStatus>();
  expectTypeOf<returns.Working>().toExtend<dto.Working>();
  expectTypeOf<Omit<dto.ReturnPolicyOptions, 'checks'>>().toExtend<returns.ReturnPolicy>();
});

it('kinds, windows and the default policy are the same on both sides', () => {
  expect(returns.ACTIVITY_KINDS).toEqual(dto.ACTIVITY_KINDS);
  expect(returns.WINDOW_CODES).toEqual(dto.WINDOW_CODES);
  const { checks, ...options } = dto.returnPolicy.parse({});
  expect(checks).toBeDefined();
  expect(returns.DEFAULT_RETURN_POLICY).toEqual(options);
});
