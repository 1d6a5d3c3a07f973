/** Words of the farm's profile and its form, in Spanish. */
export const profile = {
  edit: 'Cambiar los datos', form: 'Datos de la finca', save: 'Guardar cambios', saved: 'Los datos se han guardado.',
  seasonStartHint: 'Cualquier día, con mes y día. Queda fijo cuando se firma un registro.',
  zoneChange: 'Los registros conservan sus horas y días. Solo lo que se escriba desde ahora sigue la zona nueva.',
  zoneReason: 'Por qué cambia la zona',
  units: 'Unidades', unitsOf: { metric: 'primero litros, hectáreas y kilómetros por hora', us: 'primero galones de EE. UU., acres y millas por hora' }, unitsShort: { metric: 'Métricas', us: 'De EE. UU.' },
  unitsHint: 'En qué leen las cifras sus personas mientras no elijan otra cosa, y cuál de las dos cifras muestra primero una calibración. Lo escrito conserva su unidad.',
  calibration: 'Calibrar los pulverizadores cada', days: 'días', daysOf: '{count} día | {count} días', calibrationHint: 'Lo habitual es una vez por campaña y tras cambiar boquillas.',
  certificate: 'Certificado ecológico', certificateNone: 'ninguno anotado', certificateHas: 'La finca está certificada', number: 'Número', body: 'Certificadora', scope: 'Alcance', scopeHint: 'Con las palabras del certificado.',
  issued: 'Expedido', expires: 'Válido hasta', openEnd: 'sin fin impreso',
  contact: 'Contacto', contactNone: 'nadie anotado', person: 'A quién preguntar', address: 'Dirección', phone: 'Teléfono', email: 'Correo',
  rules: 'Normas bajo las que trabaja', rulesNone: 'ninguna nombrada', rulesHint: 'Se nombran aquí y en los informes. Los registros aún no se juzgan por ellas: lo que pide la ley no se comprueba.',
  ruleWithSource: '{title} ({source})',
  ruleSet: {
    usOrganic: { title: 'Ecológico de EE. UU.', source: 'National Organic Program, 7 CFR part 205' },
    usProduceSafety: { title: 'Seguridad de hortalizas y frutas de EE. UU.', source: '21 CFR part 112' },
    usWorkerProtection: { title: 'Protección de trabajadores de EE. UU.', source: 'Worker Protection Standard, 40 CFR part 170' },
    euOrganic: { title: 'Ecológico de la UE', source: 'Reglamento (UE) 2018/848' },
  },
  checks: {
    rules: { title: 'Normas', text: 'Nombradas: {rules}. Aún no se juzgan, así que aquí no se comprueba lo que pide la ley.' },
    certificate: { title: 'Certificado', none: 'No hay certificado anotado.', ended: 'Terminó el {day}.', soon: 'Termina el {day}, en {days} días.', open: 'No hay fin anotado.', valid: 'Válido hasta el {day}.' },
  },
}
