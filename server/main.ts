import { fileURLToPath } from 'node:url';
import { readConfig } from './config.ts';
import { createLogger } from './http/request-log.ts';
import { RunningServer } from './running-server.ts';
import { StartRefusal } from './start-refusal.ts';

/** The client lies in dist/web, seen from the sources as well as from dist/node. */
const WEB = import.meta.url.endsWith('.ts') ? '../dist/web' : '../../web';

try {
  const config = readConfig(process.env, fileURLToPath(new URL(WEB, import.meta.url)));
  const logger = createLogger(config.logLevel, process.stderr);
  const server = await RunningServer.start(config, logger, (line) => {
    process.stdout.write(`${line}\n`);
  });
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.once(signal, () => {
      void server.stop().then(() => process.exit(0));
    });
  }
  for (const defect of ['unhandledRejection', 'uncaughtException'] as const) {
    process.on(defect, (error: unknown) => {
      logger.fatal({ event: 'defect', err: error }, defect);
      setTimeout(() => process.exit(1), 800);
      void server.stop().finally(() => process.exit(1));
    });
  }
} catch (error) {
  if (!(error instanceof StartRefusal)) throw error;
  process.stderr.write(`${error.message}\n`);
  process.exit(1);
}
