// Stands in for the built server: serves, says READY, and closes on SIGTERM.
import { createServer } from 'node:http'

const { PORT, HOST, SEED_DEMO, DEMO_PASSWORD } = process.env
const server = createServer((_request, response) => response.end('{"status":"ok"}'))
server.listen(Number(PORT), HOST, () => {
  console.log(`READY ${JSON.stringify({ url: `http://${HOST}:${PORT}`, seeds: SEED_DEMO === '1', password: DEMO_PASSWORD })}`)
})
process.on('SIGTERM', () => server.close(() => process.exit(0)))
