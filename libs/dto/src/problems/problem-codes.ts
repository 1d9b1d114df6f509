/**
 * The closed list of problem codes. Each has its HTTP status, a title, and a sentence that says when it happens and what to do.
 * `type` of the problem document is `/problems/<code>`.
 */
export const PROBLEMS = {
  'validation-failed': {
    status: 422,
    title: 'Some of the input is not valid',
    remedy: 'Each entry of errors names the field and what it must be.',
  },
  'malformed-request': {
    status: 400,
    title: 'The request cannot be read',
    remedy: 'Send well-formed JSON or multipart data.',
  },
  'not-signed-in': { status: 401, title: 'Not signed in', remedy: 'Sign in and try again.' },
  'wrong-credentials': {
    status: 401,
    title: 'E-mail address or password is wrong',
    remedy: 'Check both and try again.',
  },
  'csrf-token-invalid': { status: 403, title: 'The page is out of date', remedy: 'Reload the page and try again.' },
  forbidden: {
    status: 403,
    title: 'This role may not do that',
    remedy: 'Change the role at the top of the page, or ask the plan’s administrator.',
  },
  'not-found': { status: 404, title: 'Not found', remedy: 'It does not exist, or is not yours to see.' },
  'illegal-move': { status: 409, title: 'Not possible in this state', remedy: 'Reload to see where it stands now.' },
  'run-already-going': {
    status: 409,
    title: 'A run is already going',
    remedy: 'Wait for it to end, or cancel it first.',
  },
  'quarter-not-ready': {
    status: 409,
    title: 'The quarter is not ready to run',
    remedy: 'Load what the quarter’s page lists as missing.',
  },
  'sign-off-stale': {
    status: 409,
    title: 'The run is no longer the newest',
    remedy: 'Review the newest run and sign that off.',
  },
  'second-person-needed': {
    status: 403,
    title: 'Another person has to sign off',
    remedy: 'Whoever loaded data, set the policy, decided flags or ran the quarter cannot sign it off.',
  },
  'flags-undecided': { status: 409, title: 'Some flags are not decided', remedy: 'Decide each flag of the run first.' },
  'totals-do-not-tie': {
    status: 409,
    title: 'The totals do not tie',
    remedy: 'The sign-off sheet shows which total differs and by how much.',
  },
  'not-signed-off': {
    status: 409,
    title: 'The quarter is not signed off',
    remedy: 'A second person signs it off before it can be published.',
  },
  'own-account': { status: 403, title: 'This is your own account', remedy: 'Another person has to decide on it.' },
  'reason-required': { status: 422, title: 'A reason is required', remedy: 'Say in a sentence why.' },
  'import-too-large': { status: 413, title: 'The file is too large', remedy: 'Send it as CSV, or in parts.' },
  'import-not-text': {
    status: 422,
    title: 'This is not a CSV text file',
    remedy: 'Save the file as CSV (UTF-8) and upload that.',
  },
  'import-empty': {
    status: 422,
    title: 'The file holds no rows',
    remedy: 'Upload a file with a header row and at least one row of data.',
  },
  'import-columns-missing': {
    status: 422,
    title: 'Columns are missing',
    remedy: 'Add the named columns to the header row.',
  },
  'import-malformed-csv': {
    status: 422,
    title: 'The file is not well-formed CSV',
    remedy: 'Mend the named line: quotes must be closed and each row needs as many values as the header.',
  },
  'import-control-total-mismatch': {
    status: 409,
    title: 'The control totals do not match',
    remedy: 'Compare the totals that came with the file with those counted; nothing has been loaded.',
  },
  'import-row-errors': {
    status: 409,
    title: 'Some rows have errors',
    remedy: 'Mend the listed rows in the file and upload it again; nothing has been loaded.',
  },
  'import-nothing-new': { status: 409, title: 'The same file was loaded before', remedy: 'Nothing needs to be done.' },
  'idempotency-key-reused': {
    status: 409,
    title: 'This idempotency key was used for something else',
    remedy: 'Use a new key for a new request.',
  },
  'too-many-requests': {
    status: 429,
    title: 'Too many tries',
    remedy: 'Wait for the time in the Retry-After header and try again.',
  },
  'service-unavailable': {
    status: 503,
    title: 'The service is not available just now',
    remedy: 'Try again in a moment; nothing has been lost.',
  },
  'internal-error': {
    status: 500,
    title: 'Something went wrong on our side',
    remedy: 'Try again; if it stays, give the request id to support.',
  },
} as const satisfies Record<string, { status: number; title: string; remedy: string }>;

export type ProblemCode = keyof typeof PROBLEMS;
