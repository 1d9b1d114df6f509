/** Every address of the product, in one place. */
export const paths = {
  home: '/',
  signIn: '/sign-in',
  plans: '/plans',
  plan: (planId: string) => `/plans/${planId}`,
  quarter: (quarterId: string) => `/quarters/${quarterId}`,
  files: (quarterId: string) => `/quarters/${quarterId}/files`,
  file: (quarterId: string, importId: string) => `/quarters/${quarterId}/files/${importId}`,
  review: (quarterId: string, runId: string) => `/quarters/${quarterId}/runs/${runId}/review`,
  results: (quarterId: string, runId: string) => `/quarters/${quarterId}/runs/${runId}/results`,
  run: (quarterId: string, runId: string) => `/quarters/${quarterId}/runs/${runId}`,
  signOff: (quarterId: string) => `/quarters/${quarterId}/sign-off`,
  publication: (quarterId: string) => `/quarters/${quarterId}/publication`,
  ownQuarter: '/my',
  ownQuarters: '/my/quarters',
  support: '/support',
  operations: '/operations',
};

/** Where to come back to after signing in; only addresses of our own are taken. */
export function returnAddress(search: string): string {
  const wanted = new URLSearchParams(search).get('return') ?? paths.home;
  return wanted.startsWith('/') && !wanted.startsWith('//') && !wanted.includes('\\') ? wanted : paths.home;
}
