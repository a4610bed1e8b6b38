/** The part of the browser's Trusted Types that is used here; the DOM library does not know them yet. */
interface TrustedTypes {
  createPolicy(
    name: string,
    rules: { createScriptURL: (url: string) => string },
  ): { createScriptURL(url: string): string };
}

/** The name the content security policy keeps for scripts of the build. */
const POLICY = 'angular#bundler';

let trust: ((url: string) => string) | null = null;

/** Once per page: a second policy of the name would be refused. */
function trusted(url: URL): string | URL {
  const types = (globalThis as { trustedTypes?: TrustedTypes }).trustedTypes;
  if (types === undefined) return url;
  if (trust === null) {
    const policy = types.createPolicy(POLICY, { createScriptURL: (own) => own });
    trust = (own) => policy.createScriptURL(own);
  }
  return trust(url.href);
}

/** Where there are no workers, as in a test without a browser, nobody makes one. */
const Base =
  typeof Worker === 'undefined' ? (EventTarget as unknown as typeof globalThis.Worker) : Worker;

/**
 * A worker whose script is one of the build. Import it as `Worker`: the build finds a worker's script by
 * `new Worker(new URL(…, import.meta.url))`.
 */
export class TrustedWorker extends Base {
  constructor(script: URL, options: WorkerOptions) {
    super(trusted(script), options);
  }
}
