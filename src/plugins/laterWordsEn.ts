export { default as controls } from 'element-plus/es/locale/lang/en'
export { later } from '../../shared/messages/en/later.ts'
