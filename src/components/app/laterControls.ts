import { laterPart } from '../../composables/app/laterPart.ts'

// Named here, not in the setup of a component: read ahead with whatever may show them, before anything has.

/** The dialog of Element Plus. */
export const ElDialog = laterPart(() => import('element-plus/es/components/dialog/index'))
/** Its drawer. */
export const ElDrawer = laterPart(() => import('element-plus/es/components/drawer/index'))
