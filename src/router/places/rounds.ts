// The place of the rounds. Read as one piece: a phone asks once for all of it.
export { default as RoundsView } from '../../views/rounds/RoundsView.vue'
export { default as PlanFormView } from '../../views/rounds/PlanFormView.vue'
