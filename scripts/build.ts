import { build } from './build/build.js';
import { runCommand } from './run-command.js';

/** `npm run build`: builds what has changed. */
runCommand(async () => {
  const built = await build();
  console.log(built.length > 0 ? `Built ${built.join(', ')}.` : 'Everything is built already.');
});
