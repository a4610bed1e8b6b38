import * as z from 'zod';

// Loaded as a polyfill, before any schema is made: zod's compiled parsers need `new Function`, which the content
// security policy refuses, and even the probe for it would be reported.
z.config({ jitless: true });
