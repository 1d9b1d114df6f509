export interface RunningIdentityProvider {
  readonly url: string;
  stop(): Promise<void>;
}
export async function startIdentityProvider(_options: { dataFolder: string }): Promise<RunningIdentityProvider> {
  throw new Error('to come');
}
