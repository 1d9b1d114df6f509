import { inProject } from './project-root.js';
import { runCommand } from './run-command.js';
import { launcherOf } from './services/launcher-lock.js';
import { stopProcess } from './services/process-identity.js';

/** Stops the development services that `services-up --detach` left running. Their data stays. */
runCommand(async () => {
  const launcher = launcherOf(inProject('.data/dev'));
  if (launcher === null) return console.log('Nothing is running.');
  await stopProcess(launcher, [['SIGTERM', 60_000]]);
  console.log('Stopped.');
});
