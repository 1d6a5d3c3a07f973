import { drawVolume } from './figures/pdf.ts'

// Draws so many volumes of the register and says the most memory that took, MB.
for (let volume = 1; volume <= Number(process.argv[2]); volume++) await drawVolume(volume)
process.stdout.write(String(process.resourceUsage().maxRSS / 1024))
