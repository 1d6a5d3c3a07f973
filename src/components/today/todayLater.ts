// What Today shows once it knows of something. Read as one piece.
export { default as StartOffer } from '../start/StartOffer.vue'
export { default as DueSoon } from './DueSoon.vue'
export { default as HoldsInForce } from './HoldsInForce.vue'
export { default as JobsDue } from './JobsDue.vue'
