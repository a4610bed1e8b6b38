import { monitorEventLoopDelay } from 'node:perf_hooks';

/**
 * Put in front of a server process by the suites (`node --import`), never part of the product: measures what only the
 * process itself can. Answers the message `reset` by starting anew and `read` by what was measured since.
 */
const SAMPLE_EVERY_MS = 10;

const delay = monitorEventLoopDelay({ resolution: 5 });
delay.enable();
let rssBefore = process.memoryUsage.rss();
let rssPeak = rssBefore;

setInterval(() => {
  rssPeak = Math.max(rssPeak, process.memoryUsage.rss());
}, SAMPLE_EVERY_MS).unref();

process.on('message', (message) => {
  if (message === 'reset') {
    delay.reset();
    rssBefore = process.memoryUsage.rss();
    rssPeak = rssBefore;
  }
  process.send({
    loopDelayP99Ms: delay.percentile(99) / 1e6,
    loopDelayMaxMs: delay.max / 1e6,
    rssGrowthMiB: (rssPeak - rssBefore) / 2 ** 20,
  });
});
process.channel.unref();
