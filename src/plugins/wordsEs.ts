export { default as controls } from 'element-plus/es/locale/lang/es'
export { screens } from '../../shared/messages/es.ts'
