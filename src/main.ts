import { bootstrapApplication } from '@angular/platform-browser';
import * as z from 'zod';
import { appConfig } from './app/app.config.ts';
import { App } from './app/app.ts';

// zod's compiled parsers need `new Function`, which the content security policy refuses.
z.config({ jitless: true });

bootstrapApplication(App, appConfig).catch((error: unknown) => {
  reportError(error);
});
