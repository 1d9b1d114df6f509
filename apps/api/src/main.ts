import { createApp } from './create-app.js';
import { parseEnvironment } from './config/env.js';
import { MetricsService } from './operations/metrics.service.js';

async function main(): Promise<void> {
  const environment = parseEnvironment(process.env);
  const app = await createApp(environment);
  await app.get(MetricsService).listen(environment.http.host, environment.http.metricsPort);
  await app.listen(environment.http.port, environment.http.host);
}

main().catch((error: unknown) => {
  // the logger may not exist yet, and a fault of set-up is for whoever started this
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
