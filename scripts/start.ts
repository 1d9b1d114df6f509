import { inProject } from './project-root.js';
import { type DemoAccount, type Product, startProduct } from './product/start-product.js';
import { askedToStop, runCommand } from './run-command.js';

/** `npm start`: the whole product on this machine, until Ctrl-C. The data stay in .data/start (or DATA_FOLDER). */
runCommand(async () => {
  let isStopping = false;
  const stopAsked = askedToStop().then(() => {
    isStopping = true;
    console.log('Stopping …');
  });
  let crash: (reason: Error) => void = () => undefined;
  const crashed = new Promise<never>((_, reject) => (crash = reject));
  crashed.catch(() => undefined);
  const product = await startProduct({
    dataFolder: process.env.DATA_FOLDER || inProject('.data/start'),
    ...(process.env.PORT ? { port: Number(process.env.PORT) } : { preferredPort: 4600 }),
    onCrash: (reason) => crash(new Error(reason)),
    say: (line) => console.log(line),
  }).catch((error: unknown) => {
    // Ctrl-C ends whatever step is under way, which then counts as failed
    if (isStopping) return null;
    throw error;
  });
  if (!product) return;
  try {
    if (!isStopping) announce(product);
    await Promise.race([stopAsked, crashed]);
  } finally {
    await product.stop();
  }
});

function announce(product: Product): void {
  console.log(`\nQuarterpoise runs at ${product.url}\n`);
  console.log(signIns(product.accounts));
  if (product.services.mailboxUrl) console.log(`Mail that it sends: ${product.services.mailboxUrl}`);
  console.log('Ctrl-C stops it; the data stay.');
}

function signIns(accounts: readonly DemoAccount[]): string {
  if (accounts.length === 0) return 'There are no demo sign-ins: the database was filled by somebody else.';
  const widths = (pick: (account: DemoAccount) => string) => Math.max(...accounts.map((one) => pick(one).length));
  const hat = widths((one) => one.hat);
  const email = widths((one) => one.email);
  const password = widths((one) => one.password);
  const lines = accounts.map(
    (one) =>
      `  ${one.hat.padEnd(hat)}  ${one.email.padEnd(email)}  ${one.password.padEnd(password)}  ${one.displayName}, ${one.organisation}`,
  );
  return `Demo sign-ins (role, e-mail address, password):\n${lines.join('\n')}\n`;
}
