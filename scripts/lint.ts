import { lint } from './lint/lint.js';
import { runCommand } from './run-command.js';

/** `npm run lint`: format, rules, directions of imports, unused code, types. */
runCommand(async () => {
  const { passed, failed } = await lint();
  console.log(`${passed} checks passed, ${failed} failed`);
  return failed > 0 ? 1 : 0;
});
