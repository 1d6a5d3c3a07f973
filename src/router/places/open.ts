// What opens without signing in. Read as one piece: a phone asks once for all of it.
export { default as WelcomeView } from '../../views/welcome/WelcomeView.vue'
export { default as CheckView } from '../../views/check/CheckView.vue'
export { default as ResetView } from '../../views/reset/ResetView.vue'
