export { readStep } from './steps.ts';
