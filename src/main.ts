// Before any schema is made: zod then never tries `new Function`, which the content security policy refuses and reports. Its settings may be there already.
const settings = globalThis as { __zod_globalConfig?: { jitless?: boolean } }
settings.__zod_globalConfig = Object.assign(settings.__zod_globalConfig ?? {}, { jitless: true })

// A static import would be evaluated first.
void import('./start.ts')
