import * as z from 'zod';

// zod's compiled parsers need `new Function`, which the content security policy refuses. Schemas look at this
// when they are made, so whoever starts a script imports this file first.
z.config({ jitless: true });
