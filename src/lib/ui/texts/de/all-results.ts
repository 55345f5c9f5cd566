export { answer } from './answer.ts';
export { how } from './how.ts';
export { layers } from './layers.ts';
export { question } from './question.ts';
export { reasons } from './reasons.ts';
export { results } from './results.ts';
export { warnings } from './warnings.ts';
