export { default as controls } from 'element-plus/es/locale/lang/en'
export { screens } from '../../shared/messages/en.ts'
