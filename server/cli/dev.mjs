import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import concurrently from 'concurrently';
import { requireInstalled } from './preconditions.mjs';

/** `npm run dev`: client on 4200 with /api proxied to the server on 3000; both reload. */
const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
requireInstalled(root);
const { result } = concurrently(
  [
    { name: 'web', command: 'ng serve' },
    {
      name: 'api',
      command:
        "tsx watch --tsconfig tsconfig.server.json --include 'shared/**/*.ts' server/main.ts",
    },
  ],
  { cwd: root, killOthersOn: ['failure', 'success'] },
);
result.catch(() => process.exit(1));
