/*
 * Tells zod, before it is loaded, not to try `new Function`: the policy of our pages forbids it and the browser would report it.
 *
 * An island imports this file first and what uses zod only by `import()`, for zod reads the setting when a schema is made.
 */
Object.assign(globalThis, { __zod_globalConfig: { jitless: true } });
