export { default as controls } from 'element-plus/es/locale/lang/es'
export { later } from '../../shared/messages/es/later.ts'
