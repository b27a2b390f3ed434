import { z } from 'zod';

// The browser's content policy forbids code made from text, which is zod's faster way; and zod
// tries it out, and is reported, as soon as the first schema is made. So the switch stands here,
// where every schema is made from, and not in the browser's entry, which runs after them.
z.config({ jitless: true });

export { z };
