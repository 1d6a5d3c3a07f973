/** Words of letters, in Spanish. */
export const mail = {
  greeting: 'Buenos días:',
  greetingTo: 'Buenos días, {name}:',
  foot: 'Enviado por el registro en {address}. Guarda registros y hace cuentas; deciden las etiquetas, las normas locales y las personas con licencia.',
  noReply: 'Nadie lee las respuestas a este mensaje.',
  grant: {
    subject: '{farm} le abre su libro: campaña {seasons}',
    text: '{by} le permite leer el libro de registros de {farm} para {organisation}.',
    readOnly: 'Usted lee y descarga; nada de lo que haga allí cambia un registro. Lo que se lleve queda anotado en el diario de la finca.',
    farm: 'Finca', seasons: 'Campañas', endsOn: 'Abierto hasta', day: '{endsOn}',
    open: 'Abrir mis fincas', accept: 'Poner una contraseña y abrirlo',
  },
  invitation: {
    subject: 'Tiene una invitación a {farm}',
    text: '{by} le invita a {farm}, a su registro de aplicaciones foliares y al suelo.',
    owner: 'Sería titular: todo lo de la finca, con sus personas y las funciones de cada una.',
    manager: 'Llevaría la temporada: parcelas, insumos, rondas, revisiones e informes.',
    applicator: 'Aplicaría y prepararía caldos: sus registros los hace y los firma usted.',
    certifier: 'Leería lo que la finca le conceda, sin cambiar nada.',
    action: 'Aceptar la invitación',
    until: 'El enlace sirve una sola vez, hasta el {untilOn}.',
    stranger: 'Si no conoce esta finca, no haga nada: sin usted no ocurre nada.',
  },
  jobsDue: {
    subject: '{farm}: pendientes hoy, {dueCount}',
    subjectLate: '{farm}: atrasadas {lateCount}, pendientes {dueCount}',
    text: 'En {farm}, {todayOn}, estas tareas de los planes de campaña esperan:',
    late: 'Atrasada: {preparation}',
    due: 'Pendiente: {preparation}',
    action: 'Abrir la hoja de campaña',
    why: 'Lo recibe porque dirige la finca. Llega una vez al día, y no llega cuando no hay nada pendiente.',
  },
}
