// What a record's form does without until it is used. Read as one piece: a phone asks once for all of it.
export { default as LineEditor } from './LineEditor.vue'
export { default as MeasuresDialog } from './MeasuresDialog.vue'
export { default as MixTable } from './MixTable.vue'
export { default as RecordHappened } from './RecordHappened.vue'
export { default as RecordSigned } from './RecordSigned.vue'
export { default as SignFoot } from './SignFoot.vue'
export { default as SignManyDialog } from './SignManyDialog.vue'
export { default as WhereLines } from './WhereLines.vue'
