import { giveBack } from '../../server/reports/giveBack.ts'
import { drawVolume } from './figures/pdf.ts'

// Draws so many volumes of the register, as the drawing process does one after the other, and says the most memory that took, MB.
for (let volume = 1; volume <= Number(process.argv[2]); volume++) {
  await drawVolume(volume)
  giveBack()
}
process.stdout.write(String(process.resourceUsage().maxRSS / 1024))
