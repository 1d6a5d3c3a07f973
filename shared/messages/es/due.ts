/** Palabras de lo que vence o toca. */
export const due = {
  title: 'Vence o toca',
  review: '{count} registro firmado por revisar | {count} registros firmados por revisar',
  readThem: 'Leerlos',
  kinds: { certificate: 'Certificado', calibration: 'Calibración de', uncalibrated: 'Pulverizador', training: 'Formación de', licence: 'Licencia de' },
  isDue: 'toca el {day}', wasDue: 'tocaba el {day}', ends: 'vence el {day}', ended: 'venció el {day}', never: 'sin calibrar todavía',
}
