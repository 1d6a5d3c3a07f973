// Before any schema is made: zod then never tries `new Function`, which the content security policy refuses and reports.
Object.assign(globalThis, { __zod_globalConfig: { jitless: true } })

// A static import would be evaluated first.
void import('./start.ts')
