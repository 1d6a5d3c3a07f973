// The place of the register. Read as one piece: a phone asks once for all of it.
export { default as RegisterView } from '../../views/register/RegisterView.vue'
export { default as RecordAmendView } from '../../views/register/RecordAmendView.vue'
export { default as RecordView } from '../../views/register/RecordView.vue'
