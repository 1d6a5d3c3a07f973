import type { Certificate } from '../../shared/contract/certificate.ts'

/** A certificate of the farm; a test names only what it is about. */
export const buildCertificate = (overrides: Partial<Certificate> = {}): Certificate => ({
  id: '0198c0de-0000-7000-8000-000000000118', number: 'OR-118', body: 'Oaklode Review', scope: null, validFrom: '2026-01-01', validUntil: '2026-12-31', withdrawn: null, revision: 1, ...overrides,
})
