export { check } from './linear-detector.js'
