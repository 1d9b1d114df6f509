import { returnPolicy, type ReturnPolicyOptions } from '@quarterpoise/dto';

/** The trade's usual choices; what a plan gets unless it decides otherwise. */
export const DEFAULT_POLICY_OPTIONS: ReturnPolicyOptions = returnPolicy.parse({});
