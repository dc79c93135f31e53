export { check } from './resonator.js'
